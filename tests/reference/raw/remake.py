"""Raw data files for the tests, in the ISMRMRD format (ismrmrd.h, ismrmrd.xsd), by Debian's h5py.

    /usr/bin/python3 tests/reference/raw/remake.py

Samples of the coded files say where they belong: line + 1 + 100 * coil, and i times (sample + 1), where line and sample are places on
the grid. The phantom is two ellipses of our own with a smooth phase, seen by four elements of Gaussian sensitivity.
"""
import os
import h5py
import numpy as np

folder = os.path.dirname(os.path.abspath(__file__))
counters = np.dtype([(name, '<u2') for name in (
    'kspace_encode_step_1', 'kspace_encode_step_2', 'average', 'slice', 'contrast', 'phase', 'repetition', 'set', 'segment')] + [('user', '<u2', 8)])
head = np.dtype([
    ('version', '<u2'), ('flags', '<u8'), ('measurement_uid', '<u4'), ('scan_counter', '<u4'), ('acquisition_time_stamp', '<u4'),
    ('physiology_time_stamp', '<u4', 3), ('number_of_samples', '<u2'), ('available_channels', '<u2'), ('active_channels', '<u2'),
    ('channel_mask', '<u8', 16), ('discard_pre', '<u2'), ('discard_post', '<u2'), ('center_sample', '<u2'), ('encoding_space_ref', '<u2'),
    ('trajectory_dimensions', '<u2'), ('sample_time_us', '<f4'), ('position', '<f4', 3), ('read_dir', '<f4', 3), ('phase_dir', '<f4', 3),
    ('slice_dir', '<f4', 3), ('patient_table_position', '<f4', 3), ('idx', counters), ('user_int', '<i4', 8), ('user_float', '<f4', 8)])
variable = h5py.vlen_dtype(np.dtype('<f4'))
record = np.dtype([('head', head), ('traj', variable), ('data', variable)])

noise, navigator, reverse = (1 << (position - 1) for position in (19, 23, 22))


def header(columns, rows, partitions=1, oversampling=1, trajectory='cartesian', more='', subject=''):
    def space(name, x, millimetres):
        return (f'<{name}><matrixSize><x>{x}</x><y>{rows}</y><z>{partitions}</z></matrixSize>'
                f'<fieldOfView_mm><x>{millimetres}</x><y>240</y><z>5</z></fieldOfView_mm></{name}>')
    return (f'<?xml version="1.0"?><ismrmrdHeader xmlns="http://www.ismrm.org/ISMRMRD">{subject}{more}'
            f'<experimentalConditions><H1resonanceFrequency_Hz>63870000</H1resonanceFrequency_Hz></experimentalConditions><encoding>'
            f'{space("encodedSpace", columns, 240 * oversampling)}{space("reconSpace", columns // oversampling, 240)}'
            f'<encodingLimits><kspace_encoding_step_1><minimum>0</minimum><maximum>{rows - 1}</maximum><center>{rows // 2}</center>'
            f'</kspace_encoding_step_1></encodingLimits><trajectory>{trajectory}</trajectory></encoding>'
            '<sequenceParameters><TR>500</TR><TE>12</TE><TE>24</TE><TI>0</TI><flipAngle_deg>70</flipAngle_deg></sequenceParameters></ismrmrdHeader>')


def acquisition(samples, line, centre=None, flags=0, **idx):
    """`samples` [channel, sample], complex."""
    one = np.zeros(1, record)
    h = one['head'][0]
    channels, n = samples.shape
    h['version'], h['flags'], h['number_of_samples'], h['available_channels'], h['active_channels'] = 1, flags, n, channels, channels
    h['center_sample'] = n // 2 if centre is None else centre
    h['sample_time_us'] = 5
    h['read_dir'], h['phase_dir'], h['slice_dir'] = (1, 0, 0), (0, 1, 0), (0, 0, 1)
    h['position'] = (0, 0, 7 * idx.get('slice', 0))
    h['idx']['kspace_encode_step_1'] = line
    for name, value in idx.items():
        h['idx'][name] = value
    one['traj'][0] = np.zeros(0, '<f4')
    one['data'][0] = np.ascontiguousarray(samples.astype('<c8')).view('<f4').ravel()
    return one


def write(name, xml, acquisitions):
    with h5py.File(os.path.join(folder, name + '.h5'), 'w', libver='earliest') as file:
        group = file.create_group('dataset')
        group.create_dataset('xml', data=[xml], dtype=h5py.string_dtype('ascii'), shape=(1,))
        group.create_dataset('data', data=np.concatenate(acquisitions), dtype=record)


def coded(line, columns=16, coils=1):
    coil = 100 * np.arange(coils)[:, None]
    return line + 1 + coil + 1j * (np.arange(columns)[None, :] + 1)


rows, columns = 12, 16
canaries = ('<subjectInformation><patientName>CANARY^NAME</patientName><patientID>CANARY-ID</patientID><patientBirthdate>1961-02-03</patientBirthdate>'
            '</subjectInformation><studyInformation><studyDate>2021-04-05</studyDate><studyDescription>CANARY STUDY</studyDescription></studyInformation>'
            '<measurementInformation><protocolName>CANARY PROTOCOL</protocolName></measurementInformation>')
system = ('<acquisitionSystemInformation><systemVendor>Invented Magnets</systemVendor><systemModel>Dr Canary</systemModel>'
          '<systemFieldStrength_T>1.5</systemFieldStrength_T><coilLabel><coilNumber>0</coilNumber><coilName>H1</coilName></coilLabel>'
          '<coilLabel><coilNumber>1</coilNumber><coilName>CANARY</coilName></coilLabel><institutionName>CANARY HOSPITAL</institutionName>'
          '</acquisitionSystemInformation>')
plain = header(columns, rows)

lines = [acquisition(coded(line), line) for line in range(rows)]
write('one-coil', header(columns, rows, subject=canaries, more=system),
      [acquisition(1e6 * coded(0), 0, flags=noise), acquisition(1e6 * coded(6), 6, flags=navigator)] + lines)
write('undersampled', plain, lines[::2])
write('partial', plain, lines[4:])
write('reversed', plain, [acquisition(coded(line)[:, ::-1] if line % 2 else coded(line), line, flags=reverse if line % 2 else 0) for line in range(rows)])
write('asymmetric', plain, [acquisition(coded(line)[:, 5:][:, ::-1], line, centre=7, flags=reverse) if line % 2
                            else acquisition(coded(line)[:, 5:], line, centre=3) for line in range(rows)])
write('averages', plain, [acquisition(coded(line) * weight, line, average=average)
                          for average, weight in enumerate((0.5, 1.5)) for line in range(rows)])
write('slices', plain, [acquisition(coded(line) * (1 + place + 2 * contrast), line, slice=place, contrast=contrast)
                        for place in (1, 0) for contrast in (0, 1) for line in range(rows)])
write('noise-only', plain, [acquisition(coded(0), 0, flags=noise)])
with h5py.File(os.path.join(folder, 'no-raw-data.h5'), 'w', libver='earliest') as file:
    file['temperature'] = np.arange(8.0)

# The phantom: readout oversampled twice, four elements around it.
n = 24
y, x = np.mgrid[0:n, 0:2 * n].astype(float)
y, x = (y - n // 2) / n, (x - n) / n
inside = lambda cx, cy, a, b: (((x - cx) / a) ** 2 + ((y - cy) / b) ** 2 <= 1).astype(float)
phantom = (100 * inside(0, 0, 0.36, 0.42) + 80 * inside(0.1, -0.1, 0.12, 0.1)) * np.exp(1j * (0.6 + 1.2 * x - 0.8 * y))
places = [(0.6, 0.0, 0.3), (-0.6, 0.0, 1.9), (0.0, 0.6, -2.2), (0.0, -0.6, -0.7)]
elements = np.array([phantom * np.exp(-((x - cx) ** 2 + (y - cy) ** 2) / (2 * 0.5 ** 2) + 1j * angle) for cx, cy, angle in places])
kspace = np.fft.fftshift(np.fft.fft2(np.fft.ifftshift(elements, axes=(1, 2)), norm='ortho'), axes=(1, 2))
write('four-coils', header(2 * n, n, oversampling=2, more=system), [acquisition(kspace[:, line], line) for line in range(n)])
