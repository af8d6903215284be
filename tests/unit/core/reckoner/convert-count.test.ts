import { describe, expect, it } from 'vitest';
import { CONVERTER_EXAMPLE, convertCount } from '#core/reckoner/convert-count.ts';
import { YARN_WAYS } from '#core/reckoner/read-fields.ts';
import { amountText } from '#core/units/format-amount.ts';

function told(way: string, typed: string, label: string): string | undefined {
  const line = convertCount(way, typed).lines.find((one) => one.label === label);
  if (line === undefined) return undefined;
  return line.value.kind === 'words' ? line.value.words : amountText(line.value, 'cm').replaceAll(/[\u00a0\u2009\u202f]/gu, ' ');
}

describe('one count turned into the others', () => {
  // ASTM D2260 and a sheet on Ashenhurst's rule: 8/2 cotton has 3360 yards in a pound, and is Nm 6.77.
  it('says of cotton 8/2 what is printed of it', () => {
    expect(told('ne-cotton', '8/2', 'Yards in a pound')).toBe('3360 yd');
    expect(told('ne-cotton', '8/2', 'Nm')).toMatch(/^6\.77/u);
    expect(told('ne-cotton', '8/2', '“8/2” is read as')).toBe('2 plies of 8');
  });

  it('takes plain numbers with a comma or a point, and goes there and back', () => {
    expect(told('metres', '300', 'Tex')).toBe(told('metres', '300,0', 'Tex'));
    expect(told('tex', '500', 'Metres in 100 g')).toBe('200 m');
  });

  it('begins with an example that can be turned, and answers every way of telling', () => {
    expect(convertCount(CONVERTER_EXAMPLE.way, CONVERTER_EXAMPLE.typed).wrong).toBeUndefined();
    for (const { value } of YARN_WAYS) expect(convertCount(value, value.startsWith('d') ? '400' : '4').lines.length, value).toBeGreaterThan(10);
  });

  it('says what is wrong, and answers nothing then', () => {
    for (const typed of ['', '  ', '0', '-4', 'eight', '8/0', '1e99', '9999999999', '<b>']) {
      const { wrong, lines } = convertCount('nm', typed);
      expect(wrong, typed).toMatch(/\.$/u);
      expect(lines, typed).toEqual([]);
    }
    expect(convertCount('class', '9').wrong).toContain('0, lace');
  });

  it('says of a notation that can be read in two ways that it can', () => {
    expect(convertCount('nm', '4/3').notes).toHaveLength(1);
    expect(convertCount('nm', '16/2').notes).toEqual([]);
  });

  it('takes an unknown way for the first one', () => {
    expect(convertCount('parsec', '200')).toMatchObject({ way: 'metres', typed: '200' });
  });
});
