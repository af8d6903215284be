import type { ReactNode } from 'react';
import type { PartWords } from '#islands/reckoner/parts.ts';
import { Boundary } from '#islands/ui/Boundary.tsx';
import { Button } from '#islands/ui/Button.tsx';

interface PartProps {
  readonly words: PartWords;
  readonly fields: ReactNode;
  readonly typed: ReactNode;
  /** The page answers by itself, so nothing need be sent. */
  readonly alive: boolean;
  readonly children: ReactNode;
}

/** One part of the page: what is asked at the left, what is answered at the right. */
export function Part({ words: { name: id, title, says }, fields, typed, alive, children }: PartProps) {
  return (
    <section className="part pick mt-7 scroll-mt-4 desk:grid desk:grid-cols-[340px_minmax(0,1fr)] desk:gap-7" aria-labelledby={id}>
      <div className="desk:sticky desk:top-4 desk:self-start">
        <h2 className="h2" id={id}>{title}</h2>
        <p className="small quiet mt-1 no-print">{says}</p>
        {typed}
        <div className="mt-4 grid content-start gap-4 no-print">
          {fields}
          {!alive && <div><Button type="submit">Reckon</Button></div>}
        </div>
      </div>
      <div className="answers mt-5 min-w-0 desk:mt-0">
        <Boundary says="This answer could not be drawn, and it is our fault. What you typed is kept, and the other parts answer on.">{children}</Boundary>
      </div>
    </section>
  );
}
