import { expect, it } from 'vitest';
import { describedBy, fieldId } from '#islands/ui/field-id.ts';

it('makes ids that a link can lead to, whatever the field is called', () => {
  expect(fieldId('yarns.ground.tex')).toBe('f-yarns-ground-tex');
  expect(fieldId('roles[]', 'invite')).toBe('invite-roles-');
});

it('names the hint before what is wrong, and nothing that is not there', () => {
  expect(describedBy('f-width', 'Between the inner edges', 'Width is missing.')).toBe('f-width-hint f-width-wrong');
  expect(describedBy('f-width', undefined, 'Width is missing.')).toBe('f-width-wrong');
  expect(describedBy('f-width', undefined, undefined)).toBeUndefined();
});
