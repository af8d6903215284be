/** Makes somebody a steward: `node dist/processes/appoint-steward.mjs ADDRESS [NAME]`. She is sent a link to choose a password. */
import { parseMailAddress } from '#core/mail-address.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { workerContext } from '#server/jobs/worker.ts';
import { appointSteward } from '#server/use-cases/office/appoint-steward.ts';

const [typed = '', ...names] = process.argv.slice(2);
const address = parseMailAddress(typed);
if (address.ok) {
  await appointSteward(workerContext(), { email: address.value, name: names.join(' ') || 'Steward' });
  console.log(`${address.value.address} is a steward. A link to choose a password is on its way; it works for 20 minutes, once.`);
} else {
  console.error(address.problems[0]?.message);
  process.exitCode = 1;
}
await sequelize.close();
