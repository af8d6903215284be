import { useState } from 'react';
import { Combo } from '#islands/ui/Combo.tsx';
import { Select } from '#islands/ui/Field.tsx';

interface SeeChoiceProps {
  sees: readonly { readonly value: string; readonly label: string }[];
  /** What stands chosen when the photo comes to the bench. */
  first: string;
  /** False until script runs. */
  alive: boolean;
}

const NOWHERE = { value: '', label: 'Nowhere: your words are enough' };
/** More are found by typing. */
const MOST_TO_LIST = 15;

/** Where the student reads how to mend it. Without script, and while there are few, all are listed. */
export function SeeChoice({ sees, first, alive }: SeeChoiceProps) {
  const [see, setSee] = useState(first);
  const asked = { name: 'see', label: 'Where it says how to mend it', hint: 'Goes along with mend first.' };
  const options = [NOWHERE, ...sees];
  return alive && options.length > MOST_TO_LIST
    ? <Combo {...asked} options={options} value={see} onChoose={setSee} />
    : <Select {...asked} optional options={options} value={see} onChange={(event) => setSee(event.target.value)} />;
}
