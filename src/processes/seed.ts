/** Makes the demo world in an empty database, then ends. */
import { config } from '#server/config.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { makeDemoWorld } from '#server/demo/make-demo-world.ts';

const { demoPassword } = config();
if (demoPassword === undefined) throw new Error('FELLMARK_DEMO_PASSWORD is missing: the people of the demo world need one.');
const made = await makeDemoWorld(demoPassword, (line) => { console.log(`  ${line}`); });
console.log(made ? 'the demo world is made' : 'there are people already; nothing was changed');
await sequelize.close();
