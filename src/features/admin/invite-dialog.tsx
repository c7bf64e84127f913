import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { roles } from '#shared/access/roles.ts';
import { invite } from '#shared/api/people.ts';
import { invitePerson } from '#src/api/people.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { Field, Select } from '#src/ui/field.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { toast } from '#src/ui/toast.ts';

type Invitation = z.infer<typeof invite>;

const whatFor: Record<(typeof roles)[number], string> = {
  reader: 'finds, reads and prints',
  technician: 'and works at the bench with saved settings',
  editor: 'and corrects pages and makes values live',
  archivist: 'and takes manuals in and runs the reading',
  administrator: 'and invites people and gives roles',
};

export function InviteDialog({ isOpen, onOpenChange }: { isOpen: boolean; onOpenChange: (isOpen: boolean) => void }) {
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={onOpenChange}
      title="Invite somebody"
      intro="They get a mail with a link to choose a password. It works once, for seven days."
    >
      <InviteForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function InviteForm({ onDone }: { onDone: () => void }) {
  const { mutateAsync } = useMutation(invitePerson(useQueryClient()));
  const { register, handleSubmit, setError, formState } = useForm<Invitation>({
    resolver: zodResolver(invite),
    defaultValues: { name: '', email: '', role: 'reader' },
  });
  const submit = handleSubmit(async (given) => {
    try {
      await mutateAsync(given);
      toast(`${given.name} is invited.`);
      onDone();
    } catch (error) {
      setError('root', { message: saidBy(error) });
    }
  });
  const { errors, isSubmitting } = formState;
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <Field label="Name" autoComplete="off" error={errors.name?.message} {...register('name')} />
      <Field
        label="E-mail address"
        type="email"
        autoComplete="off"
        error={errors.email?.message}
        {...register('email')}
      />
      <Select
        label="Role"
        hint="Each can do all that the one before it can."
        error={errors.role?.message}
        {...register('role')}
      >
        {roles.map((role) => (
          <option key={role} value={role}>
            {role}: {whatFor[role]}
          </option>
        ))}
      </Select>
      {errors.root?.message === undefined ? null : <Notice kind="alarm">{errors.root.message}</Notice>}
      <Actions>
        <Button look="main" type="submit" busy={isSubmitting && 'Inviting …'}>
          Send the invitation
        </Button>
        <Button onClick={onDone}>Leave</Button>
      </Actions>
    </form>
  );
}
