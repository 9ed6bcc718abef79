import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import type { PreparedFile } from '@/lib/actions/file-store';
import { refuseField } from '@/lib/errors';

/** The most pixels a picture may unpack to: a small file can name a huge one. */
const MOST_PIXELS = 60_000_000;
/** The longest side that is kept, and that of the small picture, in pixels. */
const LONGEST = 2560;
const THUMB = 360;

const PICTURES = ['image/jpeg', 'image/png', 'image/webp', 'image/heic', 'image/heif', 'image/avif'];

/**
 * Looks into a file, whatever its name says, and makes it fit to keep. Pictures are turned upright, made no larger
 * than needed and written anew as JPEG, so that nothing of the file goes on but what is seen: no place, no device, no
 * second content. A PDF is kept as it is, to be downloaded.
 * Throws `invalid_input` on `file`.
 */
export async function prepareFile(bytes: Buffer): Promise<PreparedFile> {
  if (bytes.length === 0) throw refuseField('file', 'is empty');
  const type = await fileTypeFromBuffer(bytes);
  if (type?.mime === 'application/pdf')
    return {
      kind: 'document',
      contentType: 'application/pdf',
      bytes,
      thumb: null,
      width: null,
      height: null,
    };
  if (!type || !PICTURES.includes(type.mime))
    throw refuseField('file', 'is no picture (JPEG, PNG, WebP, HEIC) and no PDF');
  return preparePicture(bytes, type.mime);
}

async function preparePicture(bytes: Buffer, mime: string): Promise<PreparedFile> {
  try {
    const upright = await sharp(bytes, { limitInputPixels: MOST_PIXELS, failOn: 'error' })
      .rotate()
      .resize({ width: LONGEST, height: LONGEST, fit: 'inside', withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .jpeg({ quality: 82 })
      .toBuffer({ resolveWithObject: true });
    const thumb = await sharp(upright.data)
      .resize({ width: THUMB, height: THUMB, fit: 'inside', withoutEnlargement: true })
      .jpeg({ quality: 72 })
      .toBuffer();
    const { width, height } = upright.info;
    return { kind: 'picture', contentType: 'image/jpeg', bytes: upright.data, thumb, width, height };
  } catch (error) {
    throw refuseField('file', faultOf(error, mime));
  }
}

function faultOf(error: unknown, mime: string): string {
  const said = error instanceof Error ? error.message : '';
  if (/pixel limit/i.test(said)) return `has more than ${MOST_PIXELS / 1_000_000} million pixels`;
  if (mime === 'image/heic' || mime === 'image/heif')
    return 'is a HEIC picture, which cannot be read here: choose JPEG (“Most compatible”) in the camera’s settings';
  return 'is a picture that cannot be read: it may be cut off or damaged';
}
