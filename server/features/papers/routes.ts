import * as contracts from '#shared/contracts/papers.ts';

import type { AppContext } from '../../context.ts';
import { type Route, route } from '../../http/route.ts';
import { exportPaper, paperSheet } from './export-service.ts';
import { proposePaper, releasePaper, returnPaper, sealPaper } from './life-service.ts';
import { createPaper, listPapers, saveDetails, savePlaces, viewPaper } from './service.ts';

/** Papers: assembling, sealing with a second person, and exports. */
export function paperRoutes(context: AppContext): Route[] {
  return [
    route(contracts.listPapers, { can: 'paper.list' }, () => listPapers(context)),
    route(contracts.createPaper, { can: 'paper.create' }, ({ actor, body }) =>
      createPaper(context, actor, body),
    ),
    route(contracts.getPaper, { can: 'paper.read' }, ({ actor, params }) =>
      viewPaper(context, actor, params.paperId),
    ),
    route(contracts.savePaperDetails, { can: 'paper.edit' }, ({ actor, params, body }) =>
      saveDetails(context, actor, params.paperId, body),
    ),
    route(contracts.savePaperPlaces, { can: 'paper.edit' }, ({ actor, params, body }) =>
      savePlaces(context, actor, params.paperId, body),
    ),
    route(contracts.getPaperSheet, { can: 'paper.read' }, ({ actor, params }) =>
      paperSheet(context, actor, params.paperId),
    ),
    route(contracts.proposePaper, { can: 'paper.propose' }, ({ actor, params, body }) =>
      proposePaper(context, actor, params.paperId, body.version),
    ),
    route(contracts.returnPaper, { can: 'paper.return' }, ({ actor, params, body }) =>
      returnPaper(context, actor, params.paperId, body),
    ),
    route(contracts.sealPaper, { can: 'paper.seal' }, ({ actor, params, body }) =>
      sealPaper(context, actor, params.paperId, body.version),
    ),
    route(contracts.releasePaper, { can: 'paper.release' }, ({ actor, params, body }) =>
      releasePaper(context, actor, params.paperId, body.version),
    ),
    route(contracts.exportPaper, { can: 'paper.export' }, ({ actor, params, signal }) =>
      exportPaper(context, actor, params.paperId, params.kind, signal),
    ),
  ];
}
