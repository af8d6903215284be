/**
 * Textile fibres by the names that Annex I of Regulation (EU) No 1007/2011 gives them, as far as hand weavers meet them,
 * each with how it is cared for. Further words by which people write them stand in `ALSO`.
 */

/** How fibres are looked after that bear the same. */
export type FibreKind = 'animal-hair' | 'silk' | 'plant' | 'coarse-plant' | 'regenerated' | 'acetate' | 'acrylic' | 'synthetic' | 'melts-early' | 'not-textile';

export const FIBRES = {
  wool: 'animal-hair', alpaca: 'animal-hair', llama: 'animal-hair', camel: 'animal-hair', cashmere: 'animal-hair', mohair: 'animal-hair',
  angora: 'animal-hair', vicuña: 'animal-hair', yak: 'animal-hair', guanaco: 'animal-hair', horsehair: 'animal-hair',
  silk: 'silk',
  cotton: 'plant', flax: 'plant', 'true hemp': 'plant', ramie: 'plant',
  kapok: 'coarse-plant', jute: 'coarse-plant', abaca: 'coarse-plant', coir: 'coarse-plant', sisal: 'coarse-plant', paper: 'coarse-plant',
  viscose: 'regenerated', modal: 'regenerated', lyocell: 'regenerated', cupro: 'regenerated',
  acetate: 'acetate', triacetate: 'acetate',
  acrylic: 'acrylic', modacrylic: 'acrylic',
  polyamide: 'synthetic', polyester: 'synthetic', elastane: 'synthetic',
  polypropylene: 'melts-early', polyethylene: 'melts-early', polylactide: 'melts-early',
  metal: 'not-textile', 'glass fibre': 'not-textile',
} as const satisfies Record<string, FibreKind>;

export type FibreName = keyof typeof FIBRES;

/** How shops and hands write them. A breed or a quality is no fibre name: merino is wool. */
const ALSO: Readonly<Record<string, FibreName>> = {
  lambswool: 'wool', merino: 'wool', 'merino wool': 'wool', 'new wool': 'wool', 'virgin wool': 'wool', 'pure wool': 'wool', 'sheep wool': 'wool', "sheep's wool": 'wool', fleece: 'wool',
  'baby alpaca': 'alpaca', 'alpaca wool': 'alpaca', 'camel hair': 'camel', 'cashmere wool': 'cashmere', 'kid mohair': 'mohair', 'angora wool': 'angora', 'horse hair': 'horsehair',
  'mulberry silk': 'silk', 'tussah silk': 'silk', tussah: 'silk',
  'organic cotton': 'cotton', 'mercerised cotton': 'cotton', linen: 'flax', 'flax (linen)': 'flax', 'linen flax': 'flax', hemp: 'true hemp', 'manila hemp': 'abaca', coconut: 'coir',
  rayon: 'viscose', tencel: 'lyocell', nylon: 'polyamide', 'polyamide or nylon': 'polyamide', spandex: 'elastane', metallic: 'metal', metallised: 'metal', glass: 'glass fibre',
};

const isName = (word: string): word is FibreName => Object.hasOwn(FIBRES, word);

/** The fibre that these words name; null when they name none we know. */
export function fibreNamed(words: string): FibreName | null {
  const plain = words.toLowerCase().replace(/\s+/g, ' ').replaceAll('’', "'").trim();
  if (isName(plain)) return plain;
  return Object.hasOwn(ALSO, plain) ? (ALSO[plain] ?? null) : null;
}

/** As it is said to people: linen is what most call the yarn of flax. */
export function fibreWords(name: FibreName): string {
  return name === 'flax' ? 'flax (linen)' : name === 'true hemp' ? 'hemp' : name;
}
