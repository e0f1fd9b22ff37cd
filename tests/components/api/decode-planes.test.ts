/** The display form of planes: the wire of server/contract/planes.ts. */
import { decodePlanes } from '@/components/api/decode-planes';
import { valueAt } from '@/components/image/display-plane';

const plane = { name: 'image', rows: 1, columns: 2, type: 'uint16', spacing: [1, 1], origin: [0, 0], low: -8, high: 0 };
const bytes = Uint8Array.of(0, 0, 0xff, 0xff, 0x34, 0x12, 0, 0).buffer;

describe('planes of an answer', () => {
  it('come apart by name, in the order of the header, little-endian', () => {
    const planes = decodePlanes(bytes, JSON.stringify([plane, { ...plane, name: 'kspace.log' }]));
    expect([...planes.keys()]).toEqual(['image', 'kspace.log']);
    expect([...(planes.get('kspace.log')?.samples ?? [])]).toEqual([0x1234, 0]);
  });

  it('hold values between low and high', () => {
    const image = decodePlanes(bytes.slice(0, 4), JSON.stringify([plane])).get('image');
    if (!image) throw new Error('the image plane must be there');
    expect([valueAt(image, 0, 0), valueAt(image, 0, 1), valueAt(image, 0, 2)]).toEqual([-8, 0, null]);
  });

  it('are refused where bytes are missing', () => {
    expect(() => decodePlanes(bytes.slice(0, 6), JSON.stringify([plane, plane]))).toThrow('planes must take 8 bytes, got 6');
  });

  it('are refused in another form than the one asked for', () => {
    expect(() => decodePlanes(bytes.slice(0, 4), JSON.stringify([{ ...plane, type: 'float32' }]))).toThrow('plane image must be uint16');
  });

  it('are refused where the header is not what the contract says', () => {
    expect(() => decodePlanes(bytes, '[{"name":"image"}]')).toThrow();
  });
});
