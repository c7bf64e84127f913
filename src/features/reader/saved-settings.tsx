import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { type FormEvent, useState } from 'react';
import { deleteSetting, saveSetting, settingsOfManual } from '#src/api/quantities.ts';
import { useCan } from '#src/api/session.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useSetting } from '#src/blocks/live-value/live-values.tsx';
import { isSameSetting } from '#src/blocks/live-value/setting-words.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Field } from '#src/ui/field.tsx';
import { Popover } from '#src/ui/popover.tsx';
import { toast } from '#src/ui/toast.ts';

type Props = { manualId: string; store: LiveStore };

/** Settings that somebody gave a name: "unit 7, channel 16". */
export function SavedSettings({ manualId, store }: Props) {
  return (
    <Popover label="Saved settings" trigger={<Button>Saved settings</Button>}>
      <h2 className="font-serif text-lead font-semibold">Saved settings</h2>
      <SavedList manualId={manualId} store={store} />
      <SaveForm manualId={manualId} store={store} />
    </Popover>
  );
}

function SavedList({ manualId, store }: Props) {
  const client = useQueryClient();
  const { data: saved = [], isPending } = useQuery(settingsOfManual(manualId));
  const remove = useMutation(deleteSetting(client, manualId));
  const setting = useSetting();
  const maySave = useCan('save-settings');
  if (isPending) return <p className="text-pencil">Fetching …</p>;
  if (saved.length === 0)
    return <p className="text-pencil">None yet. A saved setting brings a unit’s channel back with one press.</p>;
  return (
    <ul className="divide-y divide-rule">
      {saved.map(({ id, name, inputs, createdBy }) => (
        <li key={id} className="flex items-center gap-2 py-1">
          <Button
            look="quiet"
            aria-pressed={isSameSetting(inputs, setting)}
            onClick={() => store.takeSetting(inputs)}
            className="min-w-0 flex-1 justify-start text-left"
          >
            {name}
          </Button>
          <span className="text-small text-pencil">{createdBy}</span>
          {maySave ? (
            <Button
              look="quiet"
              aria-label={`Delete the setting ${name}`}
              disabled={remove.isPending}
              onClick={() => remove.mutate(id, { onError: (error) => toast.error(saidBy(error)) })}
            >
              Delete
            </Button>
          ) : null}
        </li>
      ))}
    </ul>
  );
}

function SaveForm({ manualId, store }: Props) {
  const client = useQueryClient();
  const save = useMutation(saveSetting(client, manualId));
  const setting = useSetting();
  const [name, setName] = useState('');
  const isHome = Object.keys(setting).length === 0;
  if (!useCan('save-settings'))
    return <p className="mt-2 text-small text-pencil">Technicians and up can save settings.</p>;
  const onSubmit = (event: FormEvent): void => {
    event.preventDefault();
    save.mutate(
      { name, inputs: store.setting() },
      {
        onSuccess: () => {
          setName('');
          toast(`Saved as ${name}.`);
        },
      },
    );
  };
  return (
    <form onSubmit={onSubmit} className="mt-3 border-t border-rule pt-3">
      <Field
        label="Save this setting as"
        value={name}
        onChange={({ currentTarget }) => setName(currentTarget.value)}
        maxLength={120}
        required
        disabled={isHome}
        hint={isHome ? 'Everything is at home: there is nothing to save yet.' : 'The unit and its channel, say'}
        error={save.error === null ? undefined : saidBy(save.error)}
      />
      <Button type="submit" look="main" disabled={isHome || name.trim() === ''} busy={save.isPending && 'Saving …'}>
        Save the setting
      </Button>
    </form>
  );
}
