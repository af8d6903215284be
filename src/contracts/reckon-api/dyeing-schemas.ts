/** A dyeing as it is asked about, and its plan. Every per cent is of the dry fibre's mass. */
import { choice, closed, list, mm, number, type Schema } from '#contracts/reckon-api/schema.ts';
import { CAUTIONS, EVERY_PLAN } from '#contracts/reckon-api/shared-schemas.ts';
import { YARN_TRAITS } from '#contracts/reckon-api/yarn-schemas.ts';

const { label, colour } = YARN_TRAITS;
const percent = (description: string, max = 100): Schema => number(description, { above: 0, max });
const agent = (description: string, usual: number): Schema => closed(description, { percent: percent(`Per cent; ${String(usual)} when missing.`) }, ['percent']);

export const DYEING_SCHEMAS: Readonly<Record<string, Schema>> = {
  DyePiece: closed('A dyeing with plants.', {
    craft: { const: 'dyeing' },
    fibre: closed('What is dyed.', {
      kind: choice('Kind of fibre.', 'wool', 'silk', 'other-protein', 'cotton', 'linen', 'other-cellulose'),
      massG: number('Grams, weighed dry.', { above: 0, max: 100_000 }),
      label, colour,
    }, ['label', 'colour']),
    mordant: closed('Potash alum is for wool and silk, aluminium acetate for cotton and linen.', {
      agent: choice('Metals that poison people and waters are refused.', 'alum', 'aluminium-acetate', 'none'),
      percent: percent('Per cent; 15 of alum, 8 of aluminium acetate when missing.'),
    }, ['percent']),
    tartar: agent('Cream of tartar beside alum, for wool and silk.', 6),
    tannin: agent('Before the mordant, for cotton and linen.', 8),
    dye: closed('The dyestuff.', { percent: percent('Per cent; of fresh plants 100 to 200.', 1000), label, colour }, ['label', 'colour']),
    iron: agent('Ferrous sulphate, last of all, in a pot of its own.', 2),
    liquorRatio: number('Litres of bath for a kilogram of fibre; 30 when missing.', { min: 10, max: 100 }),
  }, ['tartar', 'tannin', 'iron', 'liquorRatio']),
  DyePlan: closed('Everything a dyeing takes.', {
    craft: { const: 'dyeing' },
    steps: list('Baths in the order in which they are done.', closed('One bath.', {
      step: choice('What it does.', 'scour', 'tannin', 'mordant', 'dye', 'iron'),
      agents: list('What goes into it.', closed('One of them.', {
        agent: choice('Which.', 'alum', 'tartar', 'aluminium-acetate', 'tannin', 'dye', 'iron'),
        percent: mm('Per cent of the dry fibre.'),
        massG: mm('Grams to weigh.'),
      })),
      bathLitres: mm('Litres.'),
    })),
    bathLitres: mm('Litres of one bath.'),
    cautions: CAUTIONS,
    ...EVERY_PLAN,
  }),
};
