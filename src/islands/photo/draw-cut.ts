import { cutPixels, jpegName, type Cut } from './cut.ts';

/** Of a photo sent to a teacher: threads stay sharp, and it is smaller than most phones write. */
const JPEG_QUALITY = 0.92;
/** Longest side of the photo while it is cut, in points. */
const PREVIEW_SIDE = 1_200;

/** A photo read for drawing, upright whatever the camera wrote about its position. */
export const readUpright = (file: Blob): Promise<ImageBitmap> => createImageBitmap(file, { imageOrientation: 'from-image' });

/** Draws the part of `photo` that `cut` keeps over the whole of `canvas`, which gets its size. */
function drawOn(canvas: HTMLCanvasElement, photo: ImageBitmap, cut: Cut, mostSide?: number): void {
  const { turnedWidth, turnedHeight, x, y, width, height, scale } = cutPixels(cut, photo.width, photo.height, mostSide);
  canvas.width = width;
  canvas.height = height;
  const pen = canvas.getContext('2d');
  if (pen === null) return;
  pen.scale(scale, scale);
  pen.translate(-x, -y);
  if (cut.turns === 1) pen.translate(turnedWidth, 0);
  else if (cut.turns === 2) pen.translate(turnedWidth, turnedHeight);
  else if (cut.turns === 3) pen.translate(0, turnedHeight);
  pen.rotate((cut.turns * Math.PI) / 2);
  pen.drawImage(photo, 0, 0);
}

/** The whole photo, turned, to be cut in sight. */
export function drawTurned(canvas: HTMLCanvasElement, photo: ImageBitmap, turns: number): void {
  drawOn(canvas, photo, { turns, left: 0, top: 0, right: 1_000, bottom: 1_000 }, PREVIEW_SIDE);
}

/** @returns what `cut` keeps, as a file of its own; null when the browser cannot write it. */
export async function cutOut(photo: ImageBitmap, cut: Cut, name: string): Promise<File | null> {
  const canvas = document.createElement('canvas');
  drawOn(canvas, photo, cut);
  const blob = await new Promise<Blob | null>((resolve) => { canvas.toBlob(resolve, 'image/jpeg', JPEG_QUALITY); });
  return blob === null ? null : new File([blob], jpegName(name), { type: 'image/jpeg' });
}
