// How long the page of the reckoner takes to answer one letter typed. The budget is one frame, 16 ms, of which the browser needs its half.
import { renderToString } from 'react-dom/server';
import { createElement } from 'react';
import { bench, describe } from 'vitest';
import { answerForm } from '#core/reckoner/answer-form.ts';
import { RECKONER_DEFAULTS } from '#core/reckoner/reckoner-form.ts';
import { Reckoner } from '#islands/reckoner/Reckoner.tsx';

const form = { ...RECKONER_DEFAULTS, fringe: 'rya', wraps: '10', 'ball-length': '90', 'ball-weight': '50' };
const before = answerForm(form);
const { sett, piece } = before;

describe('the reckoner', () => {
  bench('answers a letter in all parts, under 8 ms', () => void answerForm(form));
  bench('answers a letter that one part takes in, and hands back the others, under 8 ms', () => void answerForm({ ...form, rise: '13' }, before));
  bench('writes down the workings of a part that is open, under 8 ms', () => void sett.workings?.());
  bench('writes down those of a whole hanging', () => void piece.workings?.());
  bench('draws the whole page on the server, every working with it', () => void renderToString(createElement(Reckoner, { initial: form })));
});
