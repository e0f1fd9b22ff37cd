import * as contract from '../contract/case-parts';
import { serve, type App } from '../serve';
import * as notes from '../services/case-notes';
import { moveCase } from '../services/move-case';
import { refuseQuestioned, unquestioned } from '../services/questioned-text';
import * as trials from '../services/trials';

export function serveCaseParts(app: App): void {
  const { deps } = app;
  const { db } = deps;
  serve(app, contract.keepTrial, ({ caller, params, body, gone }) =>
    trials.keepTrial(deps, caller, { caseId: params.caseId, ...unquestioned(body) }, gone),
  );
  serve(app, contract.listTrials, ({ caller, params }) => trials.listTrials(db, caller, params.caseId));
  serve(app, contract.readTrialThumbnail, ({ caller, params, query }) => trials.readTrialThumbnail(deps, caller, { ...params, ...query }));

  serve(app, contract.addMark, ({ caller, params, body }) => notes.markImage(db, caller, params.caseId, unquestioned(body)));
  serve(app, contract.listMarks, ({ caller, params }) => notes.listMarks(db, caller, params.caseId));
  serve(app, contract.removeMark, ({ caller, params }) => notes.unmark(db, caller, params.caseId, params.markId));
  serve(app, contract.addComment, ({ caller, params, body }) => notes.comment(db, caller, params.caseId, unquestioned(body)));
  serve(app, contract.listComments, ({ caller, params }) => notes.listComments(db, caller, params.caseId));
  serve(app, contract.writeFinding, ({ caller, params, body }) => notes.writeFinding(db, caller, params.caseId, unquestioned(body)));
  serve(app, contract.readTimeline, ({ caller, params }) => notes.readTimeline(db, caller, params.caseId));
  serve(app, contract.moveCase, ({ caller, params, body }) => {
    refuseQuestioned(body);
    return moveCase(db, caller, params.caseId, body);
  });
}
