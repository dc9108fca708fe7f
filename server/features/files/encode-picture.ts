import { fileTypeFromBuffer } from 'file-type';
import { AppError } from '#server/errors/app-error.ts';

/** A picture as it is kept: JPEG, at most this many pixels a side, without what a camera writes about place and owner. */
export interface EncodedPicture {
  readonly data: Buffer;
  readonly width: number;
  readonly height: number;
}

const MAX_SIDE = 1600;
const MAX_PIXELS = 60_000_000;
const QUALITY = 86;
const KINDS = new Set(['image/jpeg', 'image/png', 'image/webp', 'image/tiff', 'image/avif', 'image/heic']);

const notAPicture = (found: string) =>
  new AppError(
    415,
    'not-a-picture',
    `A plate is a picture (JPEG, PNG, WebP or TIFF), but this file is ${found}. Save it as one of these and try again.`,
  );

/** Reads what the bytes really are, whatever the file is called, and encodes them anew; 415 `not-a-picture`. */
export async function encodePicture(bytes: Buffer): Promise<EncodedPicture> {
  const kind = await fileTypeFromBuffer(bytes);
  if (!kind) throw notAPicture('none of a kind that can be recognised');
  if (!KINDS.has(kind.mime)) throw notAPicture(`of the kind ${kind.mime}`);
  // Loaded when it is first needed: it is large, and most starts never see a picture.
  const { default: sharp } = await import('sharp');
  try {
    const { data, info } = await sharp(bytes, { limitInputPixels: MAX_PIXELS })
      .rotate()
      .flatten({ background: '#ffffff' })
      .resize({ width: MAX_SIDE, height: MAX_SIDE, fit: 'inside', withoutEnlargement: true })
      .jpeg({ quality: QUALITY, mozjpeg: true })
      .toBuffer({ resolveWithObject: true });
    return { data, width: info.width, height: info.height };
  } catch (cause) {
    throw new AppError(
      415,
      'not-a-picture',
      'This picture is damaged or too large to be read. Open it, save it again at up to 60 megapixels, and try once more.',
      { cause },
    );
  }
}
