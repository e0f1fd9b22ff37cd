/**
 * The walk over the elements of a data set, within a budget: a file of a few megabytes can hold half a million empty elements, each of
 * which becomes an object and a line in the account of what was removed. The parser reads tags, short lengths and, where it looks for a
 * delimiter, everything in words of 16 bits; these are counted, so that looking for the same delimiter over and over is counted too.
 */
import dicomParser, { type ByteArrayParser, type DataSet } from 'dicom-parser';
import { explicitBigEndian, implicitLittleEndian } from './transfer-syntax';

/** About 75,000 elements. An enhanced file of 1,000 frames takes some 250 words for the functional groups of each. */
const mostWords = 250_000;

export class TooManyElements extends Error {}

export interface Walk {
  /** As much as was read. */
  readonly dataSet: DataSet;
  /** What the parser threw, if it did. */
  readonly stumbled?: unknown;
}

// The declarations of the package name the class as an interface only.
const { DataSet: EmptyDataSet } = dicomParser as typeof dicomParser & {
  readonly DataSet: new (parser: ByteArrayParser, bytes: Uint8Array, elements: DataSet['elements']) => DataSet;
};

/** The elements from `start` on, written as this transfer syntax has them once it is inflated, up to and with `untilTag`. */
export function walkElements(bytes: Uint8Array, start: number, transferSyntax: string, untilTag: string): Walk {
  const parser = transferSyntax === explicitBigEndian ? dicomParser.bigEndianByteArrayParser : dicomParser.littleEndianByteArrayParser;
  const parseDataSet =
    transferSyntax === implicitLittleEndian ? dicomParser.parseDicomDataSetImplicit : dicomParser.parseDicomDataSetExplicit;
  const counted = countedParser(parser);
  const dataSet = new EmptyDataSet(parser, bytes, {});
  try {
    const stream = new dicomParser.ByteStream(counted.parser, bytes, start);
    dataSet.warnings = stream.warnings;
    parseDataSet(dataSet, stream, bytes.length, { untilTag });
    return { dataSet };
  } catch (stumbled) {
    return { dataSet, stumbled };
  } finally {
    counted.stop();
  }
}

/** Items of sequences keep the parser, and read their values with it later, when nothing is counted any more. */
function countedParser(parser: ByteArrayParser): { parser: ByteArrayParser; stop: () => void } {
  let left = mostWords;
  return {
    parser: {
      ...parser,
      readUint16(bytes, position) {
        if (--left < 0) throw new TooManyElements(`a data set must take at most ${mostWords} words to walk`);
        return parser.readUint16(bytes, position);
      },
    },
    stop: () => {
      left = Infinity;
    },
  };
}
