import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';
import type { FormHand } from '#islands/reckoner/form-hand.ts';

/** Fields that do not show just now; what was typed in them goes along when the form is sent. */
export function Kept({ hand, fields }: { hand: FormHand; fields: readonly ReckonerField[] }) {
  return fields.map((field) => <input key={field} type="hidden" name={field} value={hand.form[field]} />);
}
