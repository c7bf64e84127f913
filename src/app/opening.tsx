import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';

export const Opening = () => (
  <Screen>
    <Pending what="Opening …" />
  </Screen>
);
