import { describe, expect, test } from 'vitest';
import { photoFault, sentOf } from '#islands/photo/photo-rules.ts';
import { cornerAt, cutPixels, jpegName, placeOf, turned, UNCUT } from '#islands/photo/cut.ts';
import { emptyShowing, showingAfter, type Showing, type ShowingEvent } from '#islands/photo/showing.ts';

describe('what is taken as a photo', () => {
  test.each([
    [{ name: 'loom.jpg', size: 2_000_000, type: 'image/jpeg' }, null],
    [{ name: 'loom.heic', size: 2_000_000, type: '' }, /Send it as JPEG/],
    [{ name: 'notes.pdf', size: 2_000, type: 'application/pdf' }, /Use JPEG, PNG or WebP, up to 25 MB/],
    [{ name: 'loom.png', size: 31_000_000, type: 'image/png' }, /^This photo is 31\.0\u00a0MB\. At most 25 MB work/],
    [{ name: 'loom.webp', size: 0, type: 'image/webp' }, /empty/],
  ])('%j', (file, fault) => {
    if (fault === null) expect(photoFault(file)).toBeNull();
    else expect(photoFault(file)).toMatch(fault);
  });

  test('how far it has come is told in the same unit', () => {
    expect(sentOf(3_100_000, 5_000_000)).toBe('3.1 of 5.0\u00a0MB');
    expect(sentOf(6_000_000, 5_000_000)).toBe('5.0 of 5.0\u00a0MB');
  });
});

describe('photos on their way', () => {
  const file = (name = 'loom.jpg', type = 'image/jpeg') => new File(['x'], name, { type });
  const after = (...events: readonly ShowingEvent[]): Showing => events.reduce(showingAfter, emptyShowing());
  const two: ShowingEvent = { kind: 'add', files: [file('front.jpg'), file('side.jpg')] };

  test('wait where the line dropped, count the tries, and go on', () => {
    const dropped = after(two, { kind: 'send' }, { kind: 'progress', key: 1, sent: 5 }, { kind: 'dropped' });
    expect(dropped).toMatchObject({ at: 'waiting', tries: 1, shots: [{ sent: 5 }, { sent: 0 }] });
    expect(showingAfter(dropped, { kind: 'dropped' })).toMatchObject({ tries: 2 });
    expect(showingAfter(dropped, { kind: 'progress', key: 1, sent: 1 })).toMatchObject({ at: 'sending', tries: 0 });
  });

  test('stopped, they are still chosen, and what has come stays there', () => {
    expect(after(two, { kind: 'send' }, { kind: 'there', key: 1, shot: 'a' }, { kind: 'stop' })).toMatchObject({ at: 'choosing', shots: [{ shot: 'a', isThere: true }, { isThere: false }] });
  });

  test('one that is refused goes, by its name, and the others stay', () => {
    expect(after(two, { kind: 'send' }, { kind: 'refused', key: 2, says: 'It is damaged.' })).toMatchObject({ at: 'choosing', fault: 'side.jpg: It is damaged.', shots: [{ key: 1 }] });
    expect(after({ kind: 'add', files: [file()] }, { kind: 'send' }, { kind: 'refused', key: 1, says: 'No.' })).toMatchObject({ fault: 'No.', shots: [] });
  });

  test('what cannot be sent is told by name, the rest is chosen; a seventh is one too many', () => {
    expect(after({ kind: 'add', files: [file('notes.pdf', 'application/pdf'), file()] })).toMatchObject({ fault: expect.stringMatching(/^notes\.pdf: .*Use JPEG/) as unknown, shots: [{ key: 1 }] });
    expect(after({ kind: 'add', files: Array.from({ length: 7 }, () => file()) })).toMatchObject({ fault: expect.stringContaining('At most 6') as unknown, shots: { length: 6 } });
  });

  test('cut anew, nothing of it has been sent', () => {
    expect(after(two, { kind: 'send' }, { kind: 'there', key: 1, shot: 'a' }, { kind: 'stop' }, { kind: 'replace', key: 1, file: file('cut.jpg') }).shots[0]).toMatchObject({ shot: null, sent: 0, isThere: false });
  });

  test('news of one that was put away changes nothing', () => {
    expect(after(two, { kind: 'put-away', key: 1 }, { kind: 'progress', key: 1, sent: 9 }, { kind: 'dropped' })).toMatchObject({ at: 'choosing', shots: [{ key: 2, sent: 0 }] });
  });
});

describe('cutting a photo', () => {
  test('turned by quarters, the same part stays in the cut, and four turns are none', () => {
    const upper = cornerAt(UNCUT, 'lower right', 1_000, 250);
    expect(turned(upper)).toEqual({ turns: 1, left: 750, top: 0, right: 1_000, bottom: 1_000 });
    expect(turned(turned(turned(turned(upper))))).toEqual(upper);
  });

  test('a corner stops at the edge of the photo, and short of the one across', () => {
    expect(cornerAt(UNCUT, 'upper left', -50, 2_000)).toEqual({ ...UNCUT, left: 0, top: 900 });
    expect(placeOf(cornerAt(UNCUT, 'lower left', 300, 700), 'lower left')).toEqual({ x: 300, y: 700 });
  });

  test('keeps the points of the part, turned sides changed over, and draws no side over 4096 points', () => {
    expect(cutPixels(cornerAt(UNCUT, 'upper left', 500, 500), 4_000, 2_000)).toMatchObject({ x: 2_000, y: 1_000, width: 2_000, height: 1_000, scale: 1 });
    expect(cutPixels(turned(UNCUT), 4_000, 2_000)).toMatchObject({ turnedWidth: 2_000, width: 2_000, height: 4_000 });
    expect(cutPixels(UNCUT, 8_192, 4_096)).toMatchObject({ width: 4_096, height: 2_048, scale: 0.5 });
  });

  test('what is drawn anew is called a JPEG', () => {
    expect([jpegName('warped.loom.heic'), jpegName('.png'), jpegName('loom')]).toEqual(['warped.loom.jpg', 'photo.jpg', 'loom.jpg']);
  });
});
