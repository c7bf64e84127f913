import { useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router';
import type { Person } from '#shared/api/people.ts';
import { signOut } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { type Theme, useTheme } from '#src/lib/theme.ts';
import { Button } from '#src/ui/button.tsx';
import { Menu, MenuChoice, MenuItem, MenuLabel, MenuRule } from '#src/ui/menu.tsx';
import { toast } from '#src/ui/toast.ts';

const themeChoices: readonly { value: Theme; label: string }[] = [
  { value: 'system', label: 'As the system' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
];

type Props = { person: Pick<Person, 'name' | 'email' | 'role'> };

export function PersonMenu({ person }: Props) {
  const [theme, chooseTheme] = useTheme();
  const client = useQueryClient();
  const navigate = useNavigate();
  const leave = (): void => {
    signOut().then(
      () => {
        client.clear();
        void navigate('/sign-in');
      },
      (error: unknown) => toast.error(saidBy(error)),
    );
  };
  return (
    <Menu
      trigger={
        <Button look="plain" className="gap-1.5 bg-transparent">
          {person.name}
          <span className="text-pencil max-sm:sr-only">{person.role}</span>
        </Button>
      }
    >
      <MenuLabel>
        {person.email}, {person.role}
      </MenuLabel>
      <MenuRule />
      <MenuChoice label="Paper" value={theme} choices={themeChoices} onValueChange={chooseTheme} />
      <MenuRule />
      <MenuItem onSelect={leave}>Sign out</MenuItem>
    </Menu>
  );
}
