/** Pixels of the picture for each unit of the drawing: sharp in print at a column's width. */
const SHARPNESS = 2;

/** Paints an SVG text as a PNG. Rejects with a sentence where the page's host does not let pictures be painted. */
export async function picturePng(svg: string, width: number, height: number): Promise<Blob> {
  const address = URL.createObjectURL(new Blob([svg], { type: "image/svg+xml" }));
  try {
    const picture = new Image(width, height);
    picture.src = address;
    await picture.decode();
    const canvas = document.createElement("canvas");
    [canvas.width, canvas.height] = [width * SHARPNESS, height * SHARPNESS];
    const pen = canvas.getContext("2d");
    if (!pen) throw new Error("This page cannot paint pictures; take the SVG instead.");
    pen.drawImage(picture, 0, 0, canvas.width, canvas.height);
    return await new Promise((resolve, reject) => canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error("The picture could not be painted; take the SVG instead."))), "image/png"));
  } finally {
    URL.revokeObjectURL(address);
  }
}
