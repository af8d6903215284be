// Texts that look like an attack and are words: read as such, they must be drawn as such.

export const HARMLESS: readonly string[] = [
  '`<script>alert(1)</script>` and \\<img src=x onerror=alert(1)>',
  '```html\n<script>alert(1)</script>\n```',
  '---\ntitle: !!js/function "x"\n---',
  '<Caution title="&lt;/p&gt;&lt;script&gt;alert(1)&lt;/script&gt;">\n&lt;img src=x onerror=alert(1)&gt;\n</Caution>',
  '![&quot; onerror=&quot;alert(1)](loom "&quot; onload=&quot;x")',
  '[a](https://a.example/?&quot;onclick=&quot;x "&quot; onclick=&quot;x")',
  '## &quot; onclick=&quot;alert(1)',
];
