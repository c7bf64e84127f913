import { useMutation, useQueryClient } from '@tanstack/react-query';
import { role, roles } from '#shared/access/roles.ts';
import type { Person } from '#shared/api/people.ts';
import { changePerson, inviteAgain, type PersonChange } from '#src/api/people.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { writtenDay } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { type Shape, StateWord, type Tone } from '#src/ui/state-word.tsx';
import { toast } from '#src/ui/toast.ts';

const looks: Record<Person['state'], { tone: Tone; shape: Shape }> = {
  active: { tone: 'good', shape: 'tick' },
  invited: { tone: 'pencil', shape: 'ring' },
  barred: { tone: 'alarm', shape: 'cross' },
};

export function PeopleTable({ people, myId }: { people: readonly Person[]; myId: string | undefined }) {
  return (
    <RuledTable
      caption="People"
      head={
        <>
          <Th>Name</Th>
          <Th>E-mail address</Th>
          <Th>Role</Th>
          <Th>State</Th>
          <Th>Since</Th>
          <Th>
            <span className="sr-only">What to do</span>
          </Th>
        </>
      }
    >
      {people.map((person) => (
        <PersonRow key={person.id} person={person} isMe={person.id === myId} />
      ))}
    </RuledTable>
  );
}

function PersonRow({ person, isMe }: { person: Person; isMe: boolean }) {
  const { id, name, email, state, createdAt } = person;
  const { mutate, isPending } = useMutation(changePerson(useQueryClient()));
  const { mutate: sendAgain, isPending: isSending } = useMutation(inviteAgain);
  const change = (what: PersonChange, done: string): void =>
    mutate(
      { personId: id, change: what },
      { onSuccess: () => toast(done), onError: (error) => toast.error(saidBy(error)) },
    );
  return (
    <tr>
      <Td className="min-w-40 font-semibold">
        {name}
        {isMe ? <span className="font-normal text-pencil"> (you)</span> : null}
      </Td>
      <Td className="min-w-56 break-words">{email}</Td>
      <Td className="min-w-40">
        <RoleSelect
          person={person}
          isDisabled={isPending}
          onChange={(next) => change({ role: next }, `${name} is now ${next}.`)}
        />
      </Td>
      <Td>
        <StateWord {...looks[state]}>{state}</StateWord>
      </Td>
      <Td className="whitespace-nowrap">{writtenDay(createdAt)}</Td>
      <Td className="whitespace-nowrap">
        <div className="flex justify-end gap-4">
          {state === 'invited' ? (
            <Button
              look="quiet"
              busy={isSending && 'Sending …'}
              aria-label={`Send ${name} the invitation again`}
              onClick={() =>
                sendAgain(id, {
                  onSuccess: () => toast(`Sent to ${email} again.`),
                  onError: (error) => toast.error(saidBy(error)),
                })
              }
            >
              Send again
            </Button>
          ) : null}
          {isMe ? null : <BarButton person={person} isDisabled={isPending} onChange={change} />}
        </div>
      </Td>
    </tr>
  );
}

type RoleProps = { person: Person; isDisabled: boolean; onChange: (next: Person['role']) => void };

const RoleSelect = ({ person, isDisabled, onChange }: RoleProps) => (
  <select
    aria-label={`Role of ${person.name}`}
    value={person.role}
    disabled={isDisabled}
    className={inputLook}
    onChange={({ currentTarget }) => onChange(role.parse(currentTarget.value))}
  >
    {roles.map((each) => (
      <option key={each}>{each}</option>
    ))}
  </select>
);

type BarProps = { person: Person; isDisabled: boolean; onChange: (change: PersonChange, done: string) => void };

function BarButton({ person: { name, state }, isDisabled, onChange }: BarProps) {
  const isBarred = state === 'barred';
  return (
    <Button
      look="quiet"
      disabled={isDisabled}
      aria-label={isBarred ? `Let ${name} in again` : `Bar ${name}`}
      onClick={() =>
        onChange({ barred: !isBarred }, isBarred ? `${name} can sign in again.` : `${name} is barred and signed out.`)
      }
    >
      {isBarred ? 'Let in again' : 'Bar'}
    </Button>
  );
}
