/** Yarn in plain knit fabric. An unravelled row of one's own swatch beats every rule here. */

/** Munden's constants of wet-relaxed plain knit: wales and courses times loop length, in cm. */
const WALES = 4.1;
const COURSES = 5.3;

/** Length in cm of one stitch, from stitches in a centimetre (Munden 1959). */
export function stitchLength(stitchesPerCm: number): number {
  return WALES / stitchesPerCm;
}

/** Yarn in mm for an area in mm²: stitches × rows × stitch length. */
export function knitYarn(areaMm2: number, stitchesPerCm: number): number {
  const lengthCm = stitchLength(stitchesPerCm);
  const rowsPerCm = COURSES / lengthCm;
  return (areaMm2 / 100) * stitchesPerCm * rowsPerCm * lengthCm * 10;
}

/** The knitters' rule, yards for inches: length × width × gauge over six. It holds a reserve. */
export function folkRuleYards(lengthIn: number, widthIn: number, stitchesPerInch: number): number {
  return (lengthIn * widthIn * stitchesPerInch) / 6;
}
