import { roles } from '#shared/access/roles.ts';
import { Button } from '#src/ui/button.tsx';

/** The server says in the page that it holds the demonstration; nothing of it shows otherwise. */
export const isDemo = (): boolean => document.querySelector('meta[name="benchleaf-demo"][content="yes"]') !== null;

const password = 'benchleaf-demo';
const emailOf = (role: string): string => `${role === 'administrator' ? 'admin' : role}@benchleaf.example`;

export function DemoAccounts({ onChoose }: { onChoose: (account: { email: string; password: string }) => void }) {
  return (
    <details className="mt-4 border-t border-rule pt-3">
      <summary className="text-signal">Demo accounts</summary>
      <p className="mt-2 text-small text-pencil">Each fills in the form for one role.</p>
      <div className="mt-2 flex flex-wrap gap-2">
        {roles.map((role) => (
          <Button key={role} onClick={() => onChoose({ email: emailOf(role), password })}>
            {role}
          </Button>
        ))}
      </div>
    </details>
  );
}
