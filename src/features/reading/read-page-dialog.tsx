import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import type { Page } from '#shared/api/pages.ts';
import type { Recipe, RecipeWish } from '#shared/reading/reading.ts';
import { readPageAgain, readingOfPage } from '#src/api/pages.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { Field, Select } from '#src/ui/field.tsx';
import { toast } from '#src/ui/toast.ts';

/** How the picture was prepared for its last reading, and a reading with other choices. */
export function ReadPageDialog({ page }: { page: Page }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={setOpen}
      width="wide"
      title={`Read page ${page.label} again`}
      intro="What people wrote stays. Words that nobody has touched take the new reading where it is surer; the rest of its news are proposals."
      trigger={<Button>Read the scan again</Button>}
    >
      {isOpen ? <Choices page={page} onDone={() => setOpen(false)} /> : null}
    </Dialog>
  );
}

const decide = '';
type Typed = Record<
  'turnDegrees' | 'segmentation' | 'skewDegrees' | 'rulesRemoved' | 'flattened' | 'wordsFrom',
  string
>;
const undecided: Typed = {
  turnDegrees: decide,
  segmentation: decide,
  skewDegrees: decide,
  rulesRemoved: decide,
  flattened: decide,
  wordsFrom: decide,
};

function Choices({ page, onDone }: { page: Page; onDone: () => void }) {
  const { data: reading } = useQuery(readingOfPage(page.id));
  const { mutate, isPending, error } = useMutation(readPageAgain(useQueryClient(), page.manualId));
  const [typed, setTyped] = useState(undecided);
  const set = (name: keyof Typed) => ({
    value: typed[name],
    onChange: ({ currentTarget }: { currentTarget: { value: string } }) =>
      setTyped({ ...typed, [name]: currentTarget.value }),
  });
  const last = lastTime(reading?.recipe);
  const lean = leanOf(typed.skewDegrees);
  const submit = (): void =>
    mutate(
      { pageId: page.id, recipe: wishOf(typed) },
      {
        onSuccess: () => {
          toast(`Page ${page.label} is in the queue.`);
          onDone();
        },
      },
    );
  return (
    <>
      <div className="grid gap-x-4 sm:grid-cols-2">
        <Choice label="Turn clockwise" last={last.turnDegrees} {...set('turnDegrees')}>
          {[0, 90, 180, 270].map((turn) => (
            <option key={turn} value={turn}>{`${turn}°`}</option>
          ))}
        </Choice>
        <Choice label="Columns" last={last.segmentation} {...set('segmentation')}>
          <option value="one-column">one column, or a table</option>
          <option value="columns">several columns of text</option>
        </Choice>
        <Field
          label="Straighten by, in degrees"
          inputMode="decimal"
          className="figures"
          hint={`Left empty, it is measured.${last.skewDegrees === undefined ? '' : ` Last time: ${last.skewDegrees}.`}`}
          error={lean === 'wrong' ? 'A number from -45 to 45.' : undefined}
          {...set('skewDegrees')}
        />
        <Choice label="Ruled lines" last={last.rulesRemoved} {...set('rulesRemoved')}>
          <option value="yes">take out for reading</option>
          <option value="no">leave in</option>
        </Choice>
        <Choice label="Uneven paper" last={last.flattened} {...set('flattened')}>
          <option value="yes">make even for reading</option>
          <option value="no">leave as scanned</option>
        </Choice>
        {last.wordsFrom === undefined ? null : (
          <Choice label="Words" last={last.wordsFrom} {...set('wordsFrom')}>
            <option value="file">those that the file carries</option>
            <option value="picture">those read in the picture</option>
          </Choice>
        )}
      </div>
      {error === null ? null : (
        <p role="alert" className="text-alarm">
          {saidBy(error)}
        </p>
      )}
      <Actions>
        <Button look="main" disabled={lean === 'wrong'} busy={isPending && 'Asking …'} onClick={submit}>
          Read it
        </Button>
        <Button onClick={onDone}>Leave</Button>
      </Actions>
    </>
  );
}

type ChoiceProps = {
  label: string;
  /** What was done at the last reading. */
  last: string | undefined;
  value: string;
  onChange: (event: { currentTarget: { value: string } }) => void;
  children: ReactNode;
};

const Choice = ({ label, last, children, ...wiring }: ChoiceProps) => (
  <Select label={label} hint={last === undefined ? undefined : `Last time: ${last}.`} {...wiring}>
    <option value={decide}>decide from the picture</option>
    {children}
  </Select>
);

/** What was done at the last reading, in words. */
function lastTime(recipe: Recipe | undefined): Partial<Typed> {
  if (recipe === undefined) return {};
  return {
    ...(recipe.turnDegrees === undefined ? {} : { turnDegrees: `${recipe.turnDegrees}°` }),
    segmentation: recipe.segmentation === 'columns' ? 'several columns' : 'one column',
    skewDegrees: recipe.skewDegrees.toFixed(2),
    rulesRemoved: recipe.rulesRemoved ? 'taken out' : 'left in',
    flattened: recipe.flattened ? 'made even' : 'left',
    ...(recipe.wordsFrom === undefined
      ? {}
      : { wordsFrom: recipe.wordsFrom === 'file' ? 'from the file' : 'from the picture' }),
  };
}

function leanOf(typed: string): number | 'wrong' | undefined {
  const text = typed.trim().replace(',', '.').replace('−', '-');
  if (text === '') return undefined;
  const lean = Number(text);
  return Number.isFinite(lean) && Math.abs(lean) <= 45 ? lean : 'wrong';
}

/** Only what was chosen; the rest is decided from the picture. */
function wishOf({ turnDegrees, segmentation, skewDegrees, rulesRemoved, flattened, wordsFrom }: Typed): RecipeWish {
  const lean = leanOf(skewDegrees);
  return {
    ...(turnDegrees === decide ? {} : { turnDegrees: Number(turnDegrees) as NonNullable<RecipeWish['turnDegrees']> }),
    ...(segmentation === decide ? {} : { segmentation: segmentation as Recipe['segmentation'] }),
    ...(typeof lean === 'number' ? { skewDegrees: lean } : {}),
    ...(rulesRemoved === decide ? {} : { rulesRemoved: rulesRemoved === 'yes' }),
    ...(flattened === decide ? {} : { flattened: flattened === 'yes' }),
    ...(wordsFrom === decide ? {} : { wordsFrom: wordsFrom as NonNullable<Recipe['wordsFrom']> }),
  };
}
