import sharp from 'sharp';

const GREY = { r: 120, g: 120, b: 130 };

/** A grey PNG as a person would choose it. */
export async function pngFile(name: string, widthPx = 40, heightPx = 30): Promise<File> {
  const bytes = await blank(widthPx, heightPx).png().toBuffer();
  return new File([new Uint8Array(bytes)], name, { type: 'image/png' });
}

/**
 * A JPEG as a phone writes it: lying on its side with the note “turn me a quarter”, the place where it was
 * taken, and the name of who took it.
 */
export async function phoneJpeg(name: string, widthPx: number, heightPx: number): Promise<File> {
  const bytes = await blank(widthPx, heightPx)
    .jpeg()
    .withExif({
      IFD0: { Artist: 'Ida Berg' },
      IFD3: {
        GPSLatitudeRef: 'N',
        GPSLatitude: '52/1 31/1 0/1',
        GPSLongitudeRef: 'E',
        GPSLongitude: '13/1 24/1 0/1',
        GPSMapDatum: 'WGS-84',
      },
    })
    .withMetadata({ orientation: 6 })
    .toBuffer();
  return new File([new Uint8Array(bytes)], name, { type: 'image/jpeg' });
}

function blank(width: number, height: number) {
  return sharp({ create: { width, height, channels: 3, background: GREY } });
}
