import { Glyph } from '#islands/ui/Glyph.tsx';

/** What is wrong with a field, and what works. */
export function Wrong({ id, says }: { id: string; says: string }) {
  return (
    <p className="wrong" id={id}>
      <Glyph name="mend" />
      {says}
    </p>
  );
}
