import sharp from 'sharp';

/** A sheet as PNG, 960 by 640 pixels. */
export const renderSheet = (svg: string): Promise<Buffer> => sharp(Buffer.from(svg)).png({ compressionLevel: 3 }).toBuffer();
