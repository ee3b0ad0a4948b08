import { PhotoRefused } from './photo-refused.js';

export type PhotoType = 'jpeg' | 'png' | 'webp' | 'heif';

const saveAsJpeg = 'Save it as JPEG, PNG or WebP and send that.';
const sendStill = 'Send one still picture as JPEG, PNG or WebP.';

/** Kinds of file that people do send and that are not taken, by how they begin. */
const refused: readonly { begins: RegExp; what: string; remedy: string }[] = [
  { begins: /^GIF8[79]a/, what: 'a GIF', remedy: sendStill },
  { begins: /^%PDF-/, what: 'a PDF', remedy: 'Send the picture itself as JPEG, PNG or WebP.' },
  { begins: /^(?:II\*\0|MM\0\*)/, what: 'a TIFF or a raw file of a camera', remedy: saveAsJpeg },
  { begins: /^BM/, what: 'a BMP', remedy: saveAsJpeg },
  { begins: /^(?:\xff\x0a|\0\0\0\x0cJXL )/, what: 'a JPEG XL', remedy: saveAsJpeg },
  {
    begins: /^(?:\xef\xbb\xbf)?\s*</,
    what: 'an SVG or another document of text',
    remedy: 'Export it as PNG and send that.',
  },
];

/** Brands of ISO 14496-12 files that hold one picture, and those that hold moving ones. */
const stillBrands = /avif|mif1|heic|heix|heim|heis/;
const movingBrands = /^(?:avis|msf1|hevc|hevx)/;

/**
 * What a file is by its own bytes; its name and declared type count for nothing. Throws PhotoRefused for everything
 * that is not a still JPEG, PNG, WebP or HEIF (AVIF included).
 */
export function typeOfPhoto(bytes: Buffer): PhotoType {
  const start = bytes.toString('latin1', 0, 64);
  if (start.startsWith('\xff\xd8\xff')) return 'jpeg';
  if (start.startsWith('\x89PNG\r\n\x1a\n')) {
    if (isMovingPng(bytes)) throw moving();
    return 'png';
  }
  if (/^RIFF[^]{4}WEBP/.test(start)) return 'webp';
  if (start.slice(4, 8) === 'ftyp') {
    if (movingBrands.test(start.slice(8))) throw moving();
    if (stillBrands.test(start.slice(8))) return 'heif';
    throw new PhotoRefused('The file is a film, not a photo.', sendStill);
  }
  const known = refused.find(({ begins }) => begins.test(start));
  if (known) throw new PhotoRefused(`The file is ${known.what}, which is not taken here.`, known.remedy);
  throw new PhotoRefused(
    bytes.length === 0 ? 'The file is empty.' : 'The file is not a photo of a kind known here.',
    saveAsJpeg,
  );
}

export function moving(): PhotoRefused {
  return new PhotoRefused('The picture moves, or the file holds several pictures.', sendStill);
}

/** An animated PNG says so in an acTL chunk before its first picture data. */
function isMovingPng(bytes: Buffer): boolean {
  let at = 8;
  while (at + 8 <= bytes.length) {
    const name = bytes.toString('latin1', at + 4, at + 8);
    if (name === 'acTL') return true;
    if (name === 'IDAT') return false;
    at += 12 + bytes.readUInt32BE(at);
  }
  return false;
}
