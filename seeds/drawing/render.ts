import sharp from 'sharp';

/** A sheet as PNG, `width` pixels across (960 is its own size). */
export const renderSheet = (svg: string, width = 960): Promise<Buffer> =>
  sharp(Buffer.from(svg)).resize({ width }).png({ compressionLevel: 3 }).toBuffer();
