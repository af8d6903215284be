/** The text without its tags of one video, and without the empty lines they leave; whatever else stands in a tag goes with it. */
export function withoutVideo(source: string, name: string): string {
  const tag = new RegExp(`^[ \\t]*<Video\\s[^<>]*\\bname="${name}"[^<>]*/>[ \\t]*(?:\\r?\\n)*`, 'gm');
  return source.replace(tag, '');
}
