const segment = (marker: number, body: Buffer): Buffer => {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(body.length + 2, 2);
  return Buffer.concat([head, body]);
};

/** An Exif segment that says which way up the picture stands and where it was taken. */
const exif = (orientation: number): Buffer => {
  const tiff = Buffer.alloc(26);
  tiff.write('II', 0, 'latin1');
  tiff.writeUInt16LE(42, 2);
  tiff.writeUInt32LE(8, 4);
  tiff.writeUInt16LE(1, 8);
  tiff.writeUInt16LE(0x0112, 10);
  tiff.writeUInt16LE(3, 12);
  tiff.writeUInt32LE(1, 14);
  tiff.writeUInt16LE(orientation, 18);
  return Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), tiff, Buffer.from('GPS-SECRET')]);
};

/** The compressed data, with bytes that look like markers and are none. */
export const JPEG_DATA = Buffer.from([0x12, 0xff, 0x00, 0x34, 0xff, 0xd0, 0x56, 0x78]);

/** The skeleton of a JPEG that stands on its side, with words of every kind that a phone writes, and a tail. */
export const turnedJpeg = (): Buffer =>
  Buffer.concat([
    Buffer.from([0xff, 0xd8]),
    segment(0xe0, Buffer.from('JFIF\0\x01\x02\0\0\x01\0\x01\0\0', 'latin1')),
    segment(0xe1, exif(6)),
    segment(0xe1, Buffer.from('http://ns.adobe.com/xap/1.0/\0GPS-SECRET', 'latin1')),
    segment(0xed, Buffer.from('Photoshop 3.0\0GPS-SECRET', 'latin1')),
    segment(0xfe, Buffer.from('GPS-SECRET')),
    segment(0xdb, Buffer.alloc(65, 1)),
    segment(0xda, Buffer.from([1, 1, 0, 0, 63, 0])),
    JPEG_DATA,
    // between two scans
    segment(0xfe, Buffer.from('GPS-SECRET')),
    segment(0xda, Buffer.from([1, 1, 0, 0, 63, 0])),
    JPEG_DATA,
    Buffer.from([0xff, 0xd9]),
    Buffer.from('GPS-SECRET behind the end'),
  ]);
