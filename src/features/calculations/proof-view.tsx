import { Link } from 'react-router';
import { likeliestCause } from '#shared/calc/proof-cause.ts';
import type { ProofItem } from '#shared/calc/proof.ts';
import { provePlan } from '#shared/plan/prove-plan.ts';
import { symbolOfStage } from '#shared/plan/stage-words.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { useLiveStore } from '#src/blocks/live-value/live-values.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { StateWord } from '#src/ui/state-word.tsx';

/** Every value at home held against what the paper prints; what disagrees comes first, with what may be amiss. */
export function ProofView() {
  const store = useLiveStore();
  if (store === null) return <Pending what="Making the proof …" />;
  const { items } = store.proof;
  if (items.length === 0) {
    return (
      <Empty title="There is nothing to prove yet">
        A value is proven against the number that the paper prints. Give quantities what is printed, or make printed
        numbers live on their pages.
      </Empty>
    );
  }
  const stages = new Map(
    provePlan(store.plan, store.quantities, store.program.tables).map((each) => [symbolOfStage(each.stage), each.says]),
  );
  const failing = items.filter(({ agrees }) => !agrees);
  const head = (
    <>
      <Th>Value</Th>
      <Th>As printed</Th>
      <Th>Worked out at home</Th>
      <Th>Proof</Th>
      <Th>Page</Th>
    </>
  );
  return (
    <section aria-label="Proof">
      <p role="status" className="mb-3">
        {failing.length === 0 ? (
          <StateWord tone="good" shape="tick">{`All ${items.length} printed values come out again.`}</StateWord>
        ) : (
          <StateWord
            tone="alarm"
            shape="cross"
          >{`${failing.length} of ${items.length} printed values do not come out.`}</StateWord>
        )}
      </p>
      <RuledTable caption="Proof" head={head}>
        {[...failing, ...items.filter(({ agrees }) => agrees)].map((item) => (
          <ProofRow key={item.symbol} item={item} store={store} planSays={stages.get(item.symbol)} />
        ))}
      </RuledTable>
    </section>
  );
}

type RowProps = {
  item: ProofItem;
  store: LiveStore;
  /** Of a stage of the frequency plan: whether it follows from the stages before it. */
  planSays: string | undefined;
};

function ProofRow({ item, store, planSays }: RowProps) {
  const { symbol, printed, computed } = item;
  const pageId = store.quantities.find((each) => each.symbol === symbol)?.pageId ?? null;
  const label = store.program.cells[store.program.slots.get(symbol) ?? -1]?.definition.label;
  return (
    <tr>
      <Td className="min-w-44">{label === undefined || label === '' ? symbol : label}</Td>
      <Td className="figures whitespace-nowrap">{printed}</Td>
      <Td className="figures whitespace-nowrap">{computed === '' ? 'unavailable' : computed}</Td>
      <Td className="max-w-96">
        <Verdict item={item} store={store} planSays={planSays} />
      </Td>
      <Td>
        {pageId === null ? null : (
          <Link to={`/pages/${pageId}/read`} className="word-link">
            look
          </Link>
        )}
      </Td>
    </tr>
  );
}

function Verdict({ item, store, planSays }: RowProps) {
  if (item.agrees)
    return (
      <StateWord tone="good" shape="tick">
        as printed
      </StateWord>
    );
  const nothingSimple = 'Nothing simple explains it: look at the scan and at the formula.';
  return (
    <>
      <StateWord tone="alarm" shape="cross">
        disagrees
      </StateWord>
      <p>{item.problem?.message ?? planSays ?? likeliestCause(store.program, item)?.says ?? nothingSimple}</p>
    </>
  );
}
