/** How an HDF5 file begins (HDF5 File Format Specification, superblock). */
export const hdf5Signature = Uint8Array.of(0x89, 0x48, 0x44, 0x46, 0x0d, 0x0a, 0x1a, 0x0a);

export const isHdf5 = (bytes: Uint8Array): boolean => hdf5Signature.every((byte, i) => bytes[i] === byte);
