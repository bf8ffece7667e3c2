import * as contracts from '#shared/contracts/items.ts';

import type { AppContext } from '../../context.ts';
import { type Route, route } from '../../http/route.ts';
import { assayLatest } from './assay-service.ts';
import { recallItem, sendToReview, startRevision, withdrawItem } from './life-service.ts';
import { createItem, getItem, getRevision, listItems, listRevisions, saveDraft } from './service.ts';

/** The bank, and the life of each item. */
export function itemRoutes(context: AppContext): Route[] {
  return [
    route(contracts.listItems, { can: 'item.list' }, ({ actor, query }) => listItems(context, actor, query)),
    route(contracts.createItem, { can: 'item.create' }, ({ actor, body }) =>
      createItem(context, actor, body),
    ),
    route(contracts.getItem, { can: 'item.read' }, ({ actor, params }) =>
      getItem(context, actor, params.itemId),
    ),
    route(contracts.saveDraft, { can: 'item.edit' }, ({ actor, params, body }) =>
      saveDraft(context, actor, params.itemId, body),
    ),
    route(contracts.startRevision, { can: 'item.edit' }, ({ actor, params }) =>
      startRevision(context, actor, params.itemId),
    ),
    route(contracts.listRevisions, { can: 'item.read' }, ({ actor, params }) =>
      listRevisions(context, actor, params.itemId),
    ),
    route(contracts.getRevision, { can: 'item.read' }, ({ actor, params }) =>
      getRevision(context, actor, params.itemId, params.number),
    ),
    route(contracts.assayItem, { can: 'item.assay' }, ({ actor, params }) =>
      assayLatest(context, actor, params.itemId),
    ),
    route(contracts.sendToReview, { can: 'item.send' }, ({ actor, params, body }) =>
      sendToReview(context, actor, params.itemId, body),
    ),
    route(contracts.recallItem, { can: 'item.recall' }, ({ actor, params, body }) =>
      recallItem(context, actor, params.itemId, body.reason),
    ),
    route(contracts.withdrawItem, { can: 'item.withdraw' }, ({ actor, params, body }) =>
      withdrawItem(context, actor, params.itemId, body.reason),
    ),
  ];
}
