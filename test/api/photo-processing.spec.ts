import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import {
  animatedGif,
  animatedPng,
  animatedWebp,
  documentAsPdf,
  drawingAsSvg,
  jpeg,
  jpegFromTelephone,
  pageAsHtml,
  picture,
  pngBomb,
} from '../fixtures/photos.js';
import { hashOfPhoto, processPhoto, widthsFor } from '../../server/photos/photo-processing.js';

async function colourAt(bytes: Buffer, across: number, down: number): Promise<number[]> {
  const { data, info } = await sharp(bytes).removeAlpha().raw().toBuffer({ resolveWithObject: true });
  const at =
    (Math.floor(down * (info.height - 1)) * info.width + Math.floor(across * (info.width - 1))) *
    info.channels;
  return [...data.subarray(at, at + 3)];
}

function isNear(colour: number[], wanted: number[]): boolean {
  return colour.every((part, index) => Math.abs(part - (wanted[index] ?? 0)) < 40);
}

describe('a photo that is taken', () => {
  test('when a telephone sends its photo lying, then every file stands upright', async () => {
    const photo = await processPhoto(await jpegFromTelephone());
    expect([photo.width, photo.height]).toEqual([640, 480]);
    expect(photo.files.map(({ width, format }) => `${width} ${format}`)).toEqual(['480 avif', '480 webp']);
    for (const { bytes } of photo.files) {
      expect(await colourAt(bytes, 0.5, 0.02)).toSatisfy((colour: number[]) =>
        isNear(colour, [255, 255, 255]),
      );
      expect(await colourAt(bytes, 0.1, 0.8)).toSatisfy((colour: number[]) => isNear(colour, [192, 32, 32]));
      expect(await colourAt(bytes, 0.9, 0.8)).toSatisfy((colour: number[]) => isNear(colour, [32, 32, 192]));
    }
  });

  test('when a telephone says where and by what a photo was taken, then no file tells', async () => {
    const original = await jpegFromTelephone();
    expect((await sharp(original).metadata()).exif?.includes('SN-000-SECRET')).toBe(true);
    for (const { bytes } of (await processPhoto(original)).files) {
      const { exif, xmp, iptc, icc, orientation } = await sharp(bytes).metadata();
      expect({ exif, xmp, iptc, icc, orientation }).toEqual({});
      expect(bytes.includes('SECRET')).toBe(false);
      expect(bytes.includes('Invented Cameras')).toBe(false);
    }
  });

  test('when a photo has wider colours than screens are sure to show, then they are brought to sRGB', async () => {
    const wide = await picture().withIccProfile('p3').png().toBuffer();
    for (const { bytes } of (await processPhoto(wide)).files)
      expect(await colourAt(bytes, 0.1, 0.8)).toSatisfy((colour: number[]) => isNear(colour, [192, 32, 32]));
  });

  test.each([
    ['grey', () => picture().toColourspace('b-w').png().toBuffer()],
    ['of 16 bits a colour', () => picture().toColourspace('rgb16').png().toBuffer()],
    ['in printing colours', () => picture().toColourspace('cmyk').jpeg().toBuffer()],
    ['see-through', () => picture().ensureAlpha(0.5).png().toBuffer()],
    ['WebP', () => picture().webp().toBuffer()],
    ['AVIF', () => picture().avif({ effort: 0 }).toBuffer()],
  ])('when a photo is %s, then both formats are made', async (_kind, make) => {
    const photo = await processPhoto(await make());
    for (const { bytes, format } of photo.files) {
      const header = await sharp(bytes).metadata();
      expect(header.format).toBe(format === 'avif' ? 'heif' : 'webp');
      expect([header.width, header.height, header.channels]).toEqual([480, 360, 3]);
    }
  });

  test('when any photo is taken, then its placeholder is a data address below a kilobyte that shows it', async () => {
    const { placeholder } = await processPhoto(await jpeg());
    expect(placeholder.length).toBeLessThan(1024);
    const tiny = Buffer.from(placeholder.replace('data:image/webp;base64,', ''), 'base64');
    expect((await sharp(tiny).metadata()).width).toBe(16);
  });

  test.each([
    [4000, [480, 960, 1920]],
    [1920, [480, 960, 1920]],
    [1800, [480, 960, 1800]],
    [1280, [480, 960]],
    [960, [480, 960]],
    [900, [480, 900]],
    [500, [480]],
    [479, [479]],
  ])(
    'when the original is %i pixels wide, then files of these widths are made and none is enlarged',
    (original, widths) => {
      expect(widthsFor(original)).toEqual(widths);
    },
  );

  test('when the bytes differ, then so does the hash', async () => {
    expect(hashOfPhoto(await jpeg(640, 480))).toBe(hashOfPhoto(await jpeg(640, 480)));
    expect(hashOfPhoto(await jpeg(640, 480))).not.toBe(hashOfPhoto(await jpeg(640, 482)));
  });
});

describe('a file that is refused', () => {
  test.each([
    ['an SVG', () => drawingAsSvg, /SVG/],
    ['a PDF', () => documentAsPdf, /PDF/],
    ['a page', () => pageAsHtml, /document of text/],
    ['a GIF', animatedGif, /GIF/],
    ['an animated WebP', animatedWebp, /moves/],
    ['an animated PNG', animatedPng, /moves/],
    ['a picture that unpacks to 400 million pixels', () => pngBomb(), /400 million pixels/],
    ['a TIFF', () => picture().tiff().toBuffer(), /TIFF/],
    ['a film', () => Buffer.from('\0\0\0\x18ftypisom\0\0\0\0isommp42', 'latin1'), /film/],
    ['nothing', () => Buffer.alloc(0), /empty/],
    ['noise', () => Buffer.alloc(5000, 7), /not a photo/],
    ['a start of a JPEG and nothing else', () => Buffer.from('\xff\xd8\xff\xe0', 'latin1'), /damaged/],
    ['half a JPEG', async () => (await jpeg(1200, 900)).subarray(0, 6000), /damaged/],
    ['half a PNG', async () => (await picture(1200, 900).png().toBuffer()).subarray(0, 2000), /damaged/],
    ['a stamp', () => jpeg(99, 400), /at least 100/],
    ['a strip', () => jpeg(2000, 200), /eight times/],
  ])('when %s is sent, then the reason and a remedy are told', async (_what, make, reason) => {
    const bytes = await make();
    await expect(processPhoto(bytes)).rejects.toMatchObject({
      type: 'photo-refused',
      status: 422,
      detail: expect.stringMatching(reason),
      remedy: expect.stringMatching(/\w/),
    });
  });
});
