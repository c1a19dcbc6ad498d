/** Hands a finished picture to the person as a file. */
export function saveAddress(address: string, fileName: string, document: Document): void {
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
}

/** A file name that every system takes, from what the picture is called. */
export function fileNameOf(title: string, ending: string): string {
  const plain = title
    .normalize('NFKD')
    .replace(/[^\p{Letter}\p{Number}]+/gu, '-')
    .replace(/^-+|-+$/g, '')
    .toLowerCase();
  return `${plain || 'chart'}.${ending}`;
}

/** The drawing's own text as an address; charset named, because labels carry more than ASCII. */
export function svgAddress(svg: string): string {
  return `data:image/svg+xml;charset=utf-8,${encodeURIComponent(svg)}`;
}

/** Paints an SVG onto a canvas at twice its size and returns the PNG's address. */
export async function pngAddress(
  svg: string,
  size: { readonly width: number; readonly height: number },
  ground: string,
  document: Document,
): Promise<string> {
  const image = new Image();
  image.src = svgAddress(svg);
  await image.decode();
  const canvas = document.createElement('canvas');
  canvas.width = size.width * 2;
  canvas.height = size.height * 2;
  const context = canvas.getContext('2d');
  if (!context) throw new Error('This browser cannot paint pictures.');
  context.fillStyle = ground;
  context.fillRect(0, 0, canvas.width, canvas.height);
  context.drawImage(image, 0, 0, canvas.width, canvas.height);
  return canvas.toDataURL('image/png');
}
