/** The workings of a dyeing; ids are paths in its plan: `bathLitres`, `steps.1.agents.0.massG` … */
import { AGENT_WORDS } from '#core/craft/dyeing/amounts.ts';
import type { DyeAgent } from '#core/craft/dyeing/piece.ts';
import { HOURS_A_BATH, LIQUOR_RATIO, readDyeing, reckonDyeing, USUAL } from '#core/craft/dyeing/plan-dyeing.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { noteHoursInAll, pace } from '#core/craft/show-how/note-hours.ts';
import { from, given, standing, type Notebook, type Standing } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { WorkingInput } from '#core/craft/show-how/working.ts';

const RECIPES: Standing = { source: 'published recipes; try a swatch', trust: 'practice' };
const OF_FIBRE: Standing = { source: 'a share of the dry fibre, as every recipe is written', trust: 'counted' };

/** Under which key of the piece the per cent of an agent may be given. */
const groupOf = (agent: DyeAgent): string => (agent === 'alum' || agent === 'aluminium-acetate' ? 'mordant' : agent);

function percentOf(fields: Fields, agent: DyeAgent, value: number): WorkingInput {
  const number = { symbol: 'p', name: `per cent of ${AGENT_WORDS[agent].toLowerCase()}`, value, unit: 'percent' } as const;
  const group = groupOf(agent);
  const isGiven = agent === 'dye' || fields.optionalGroup(group, AGENT_WORDS[agent])?.has('percent') === true;
  return isGiven ? given(number, `/${group}/percent`, 'counted') : standing({ ...number, value: USUAL[agent] }, RECIPES);
}

export function noteDyeing(book: Notebook, fields: Fields): boolean {
  const dyeing = readDyeing(fields);
  if (dyeing === undefined) return false;
  const plan = reckonDyeing(dyeing);
  const fibre = given({ symbol: 'm', name: 'dry fibre', value: dyeing.fibre.massG, unit: 'g' }, '/fibre/massG', 'measured');
  book.note({ id: 'massG', name: 'what is dyed', formula: 'm', inputs: [fibre], value: plan.massG, unit: 'g', ...RULES.asGiven });
  const ratio = { symbol: 'k', name: 'litres of bath for a kilogram of fibre', value: dyeing.liquorRatio, unit: 'l-per-kg' } as const;
  const bath = book.note({
    id: 'bathLitres', name: 'litres of one bath', formula: 'm / 1000 * k',
    inputs: [fibre, fields.has('liquorRatio') ? given(ratio, '/liquorRatio', 'counted') : standing({ ...ratio, value: LIQUOR_RATIO }, { source: 'common practice', trust: 'practice' })],
    value: plan.bathLitres, unit: 'l', ...OF_FIBRE,
  });
  plan.steps.forEach(({ step, agents, bathLitres }, index) => {
    const id = `steps.${String(index)}`;
    book.note({ id: `${id}.bathLitres`, name: `litres of the bath to ${step}`, formula: 'b', inputs: [from('b', bath)], value: bathLitres, unit: 'l', ...RULES.arithmetic });
    agents.forEach(({ agent, percent, massG }, at) => {
      const words = AGENT_WORDS[agent].toLowerCase();
      const share = book.note({ id: `${id}.agents.${String(at)}.percent`, name: `${words} for a hundred parts of fibre`, formula: 'p', inputs: [percentOf(fields, agent, percent)], value: percent, unit: 'percent', ...RULES.asGiven });
      book.note({ id: `${id}.agents.${String(at)}.massG`, name: `${words} to weigh`, formula: 'm * p / 100', inputs: [fibre, from('p', share)], value: massG, unit: 'g', ...OF_FIBRE });
    });
  });
  const baths = standing({ symbol: 'n', name: 'baths', value: plan.steps.length, unit: 'count' }, RULES.count);
  noteHoursInAll(book, plan.hours, 'n * h', [baths, pace('h', 'hours at work in a bath, without the time it stands', HOURS_A_BATH, 'h')]);
  return true;
}
