import * as contract from '../contract/images';
import { serve, type App } from '../serve';
import { makeComplexImage, pairsOf } from '../services/complex-image';
import { fileReader, takenOf } from '../services/file-reader';
import { confirmNoTextOn, discardImage } from '../services/look-for-text';
import { formAskedFor } from '../services/planes-answer';
import { correctFacts, readImage, readImplications, readPixels, readThumbnail } from '../services/read-image';

export function serveImages(app: App): void {
  const { deps } = app;
  const { db } = deps;
  serve(app, contract.uploadImages, ({ request }) => Promise.resolve(takenOf(request)), {
    reader: (callerOf) => fileReader(deps, callerOf),
    status: ({ images }) => (images.length > 0 ? contract.uploadImages.status : 422),
  });
  serve(app, contract.readImage, ({ caller, params }) => readImage(db, caller, params.imageId));
  serve(app, contract.confirmNoText, ({ caller, params }) => confirmNoTextOn(deps, caller, params.imageId));
  serve(app, contract.discardImage, ({ caller, params }) => discardImage(deps, caller, params.imageId));
  serve(app, contract.readPairs, ({ caller, params }) => pairsOf(deps, caller, params.imageId));
  serve(app, contract.makeComplexImage, ({ caller, body, gone }) => makeComplexImage(deps, caller, body, gone));
  serve(app, contract.correctFacts, ({ caller, params, body }) => correctFacts(db, caller, params.imageId, body));
  serve(app, contract.readPixels, ({ caller, params, query, request, gone }) =>
    readPixels(deps, caller, { ...params, ...query, form: formAskedFor(request) }, gone),
  );
  serve(app, contract.readThumbnail, ({ caller, params, query, gone }) => readThumbnail(deps, caller, { ...params, ...query }, gone));
  serve(app, contract.readImplications, ({ caller, params, query }) =>
    readImplications(db, caller, params.imageId, query.ghostFrequencyHz),
  );
}
