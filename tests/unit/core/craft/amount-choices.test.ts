import { describe, expect, test } from 'vitest';
import { amountChoices } from '#core/craft/amount-choices.ts';
import { planOf, PLAIN_PIECE, pieceWith } from './a-piece.ts';

const groupsOf = (piece = pieceWith({})) => amountChoices(piece, planOf(piece), 'cm');
const keysOf = (title: string, piece = pieceWith({})): string[] => groupsOf(piece).find((group) => group.title === title)?.choices.map(({ key }) => key) ?? [];

describe('the amounts a teacher chooses from', () => {
  test('stand in the order in which a loom is set up', () => {
    expect(groupsOf().map(({ title }) => title)).toEqual(['Size and loom', 'Warp', 'Yarns', 'Bands', 'Tools and time']);
  });

  test('stand where one looks for them', () => {
    expect(keysOf('Size and loom')).toEqual(['nails', 'width', 'height', 'wound-width', 'loom.width', 'loom.height']);
    expect(keysOf('Warp')).toEqual(['ends', 'spacing', 'warp', 'warp.mass']);
    expect(keysOf('Yarns')).toEqual(['yarn.ground', 'yarn.ground.mass']);
    expect(keysOf('Bands')).toEqual(['band.sky.height', 'band.sky.rows', 'band.sky.yarn']);
    expect(keysOf('Tools and time')).toEqual(expect.arrayContaining(['spacer.width', 'hours', 'mass', 'pick', 'rows-per-load']));
  });

  test('leave out a group that has nothing to tell', () => {
    expect(groupsOf(pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', fill: true }] })).map(({ title }) => title)).not.toContain('Bands');
  });

  test('say what each is at present, in the units asked for', () => {
    const textOf = (units: 'cm' | 'in'): string | undefined =>
      amountChoices(PLAIN_PIECE, planOf(PLAIN_PIECE), units).flatMap(({ choices }) => choices).find(({ key }) => key === 'width')?.text.replaceAll(/\s/gu, ' ');
    expect([textOf('cm'), textOf('in')]).toEqual(['30 cm', '11 13/16 in']);
  });

  test('are called what they are, a yarn with its role', () => {
    const labels = groupsOf().map(({ choices }) => choices.map(({ label }) => label));
    expect(labels.slice(0, 4)).toEqual([
      ['Nails on the upper rail', 'Width', 'Height', 'Width of the warp', 'Inside width of the loom, at least', 'From nail to nail upright, at least'],
      ['Warp ends', 'From end to end', 'Warp yarn', 'Warp yarn'], ['ground (ground)', 'ground (ground)'], ['Sky: height', 'Sky: rows', 'Sky: ground'],
    ]);
    const bare = pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', fill: true }] });
    expect(amountChoices(bare, planOf(bare), 'cm').map(({ title }) => title)).toEqual(['Size and loom', 'Warp', 'Yarns', 'Tools and time']);
  });

  test('tell two yarns of one name apart by their roles', () => {
    const yarn = { metresPer100g: 180, label: 'Fenwool 6/2' };
    const piece = pieceWith({ yarns: { ground: yarn, figure: yarn } });
    const labels = groupsOf(piece).find(({ title }) => title === 'Yarns')?.choices.map(({ label }) => label) ?? [];
    expect(new Set(labels)).toEqual(new Set(['Fenwool 6/2 (ground)', 'Fenwool 6/2 (figure)']));
  });
});
