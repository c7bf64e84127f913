import type { ReactNode } from 'react';

/** The sheet in front of the library: a drawing sheet, with what is asked in its title block. */
export function Door({ title, children }: { title: string; children: ReactNode }) {
  return (
    <main className="flex flex-1 p-3 sm:p-6">
      <div className="flex flex-1 flex-col border border-edge p-1">
        <div className="flex flex-1 flex-col border-2 border-ink bg-leaf lg:flex-row lg:items-end">
          <Example />
          <section className="w-full border-t-2 border-ink lg:w-[400px] lg:border-l-2" aria-labelledby="door-title">
            <div className="flex border-b border-ink">
              <p className="flex-1 px-4 py-3 font-serif text-title font-semibold">Benchleaf</p>
              <p className="border-l border-rule px-4 py-3 text-small text-pencil">
                Old manuals,
                <br />
                live numbers
              </p>
            </div>
            <div className="px-4 pt-3 pb-5">
              <h1 id="door-title" className="mb-3 font-serif text-lead font-semibold">
                {title}
              </h1>
              {children}
            </div>
          </section>
        </div>
      </div>
    </main>
  );
}

/** A line of a manual, corrected as a technician pencils into the book. */
const Example = () => (
  <figure className="flex flex-1 flex-col justify-center self-stretch px-5 py-6 sm:px-10 lg:px-16">
    <p className="max-w-[30em] font-serif text-lead leading-10 text-balance sm:text-title sm:leading-12 lg:text-display lg:leading-14">
      Set the channel switch to <Corrected printed="12" now="16" />. Zero the generator on{' '}
      <Corrected printed="156.600" now="156.800" /> mc; the crystal is then{' '}
      <Corrected printed="16.2111" now="16.2333" /> mc.
    </p>
    <figcaption className="mt-4 max-w-[44em] text-small text-pencil">
      A manual that was printed for one channel, set to another. What the paper says stays, struck, above what it is
      now.
    </figcaption>
  </figure>
);

const Corrected = ({ printed, now }: { printed: string; now: string }) => (
  <span className="relative inline-block pt-3 leading-7 lg:leading-9 whitespace-nowrap">
    <del className="figures absolute -top-1.5 left-0 text-small leading-5 text-pencil">{printed}</del>
    <ins className="figures border-b-2 border-dotted border-signal text-signal no-underline">{now}</ins>
  </span>
);
