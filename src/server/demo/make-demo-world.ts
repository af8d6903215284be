/** The demo world, made once into an empty database, through the same use-cases as any other. */
import { emptyAllTables } from '#server/db/empty-tables.ts';
import { actingAs } from '#server/demo/acting-as.ts';
import { makePeople, makeSteward, whoLivesHere } from '#server/demo/people.ts';
import { askForLetters, bringMaudToPartTwo, giveSeat, writeToClass } from '#server/demo/progress.ts';
import { askAndAnswer } from '#server/demo/questions.ts';
import { bringIn } from '#server/demo/series.ts';
import { drawVideos } from '#server/demo/videos.ts';
import type { User } from '#server/models/index.ts';
import { services } from '#server/services.ts';
import { publishSeries } from '#server/use-cases/series/publish-series.ts';

/** @returns false when somebody lives here already. */
export async function makeDemoWorld(password: string, say: (line: string) => void): Promise<boolean> {
  const here = await whoLivesHere();
  if (here === 'somebody') return false;
  if (here === 'half') {
    say('clearing away a demo world that was cut off');
    await emptyAllTables();
  }
  const now = new Date();
  const { users, saltmarsh, cordage } = await makePeople(password, now);
  const person = (address: string): User => {
    const user = users.get(address);
    if (user === undefined) throw new RangeError(address);
    return user;
  };
  say('people and workrooms');
  const ilse = person('ilse@saltmarsh.example');
  const lowTide = await bringIn(ilse, saltmarsh, 'low-tide');
  const teodor = person('teodor@cordage.example');
  const cords = await bringIn(teodor, cordage, 'three-knotted-cords');
  await publishSeries(await actingAs(teodor), cords.slug);
  say('series');
  await drawVideos(services().media, lowTide, ilse.id);
  say('films');
  await publishSeries(await actingAs(ilse), lowTide.slug);
  const maudsSeat = await giveSeat(person('maud@weavers.example'), lowTide, 9, now);
  await giveSeat(person('jonas@weavers.example'), lowTide, 2, now);
  await bringMaudToPartTwo(person('maud@weavers.example'), lowTide, maudsSeat);
  await askAndAnswer(lowTide, { maud: person('maud@weavers.example'), jonas: person('jonas@weavers.example'), wren: person('wren@saltmarsh.example') });
  await askForLetters(person('maud@weavers.example'), saltmarsh);
  await writeToClass(ilse, lowTide);
  await makeSteward(password, now);
  say('students');
  return true;
}
