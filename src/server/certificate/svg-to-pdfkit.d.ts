/** As far as it is used here; the package brings no types. */
declare module 'svg-to-pdfkit' {
  const svgToPdf: (doc: PDFKit.PDFDocument, svg: string, x: number, y: number, options?: { width?: number; height?: number; preserveAspectRatio?: string; assumePt?: boolean }) => void;
  export { svgToPdf as default };
}
