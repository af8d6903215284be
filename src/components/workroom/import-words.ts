import type { ImportState } from '#contracts/series-folder.ts';

/** Where a folder stands on its way in, in one sentence. */
export function importWords(folder: ImportState): string {
  switch (folder.state) {
    case 'waiting':
      if (folder.before === 0) return 'It is next.';
      return folder.before === 1 ? 'It waits. One other folder comes first.' : `It waits. ${folder.before} other folders come first.`;
    case 'working':
      return folder.filesAll === 0 ? 'Its texts are being read.' : `Its pictures and films are being taken over: ${folder.filesDone} of ${folder.filesAll}.`;
    case 'done':
      return folder.title === null ? 'It came in. The series was deleted since.' : `“${folder.title}” came in.`;
    case 'refused':
      return 'It did not come in. Nothing of it was kept.';
  }
}
