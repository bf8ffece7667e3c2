import * as contracts from '#shared/contracts/checking.ts';
import type { ItemContent } from '#shared/engine/index.ts';

import type { AppContext } from '../../context.ts';
import { demand } from '../../http/demand.ts';
import { type Route, route } from '../../http/route.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { storedFigures } from '../figures/stored-figures.ts';
import { requireItem, subjectOf } from '../items/service.ts';

async function figuresOf(context: AppContext, actor: SignedIn, itemId: number, content: ItemContent) {
  const item = await requireItem(context.database, itemId);
  demand(actor, 'item.read', await subjectOf(context.database, item, actor.id));
  return storedFigures(context.database, content);
}

/** Checks of content that is not saved yet; nothing is stored. */
export function checkingRoutes(context: AppContext): Route[] {
  return [
    route(contracts.viewDraw, { can: 'item.read' }, async ({ actor, params, body, signal }) => {
      const figures = await figuresOf(context, actor, params.itemId, body.content);
      return context.engine.viewDraw(body.content, body.draw, figures, { signal });
    }),
    route(contracts.checkItem, { can: 'item.read' }, async ({ actor, params, body, signal }) => {
      const figures = await figuresOf(context, actor, params.itemId, body.content);
      const [view, report] = await Promise.all([
        context.engine.viewDraw(body.content, body.draw, figures, { signal }),
        context.engine.assay(body.content, {
          figures: figures.map(({ figureId, svg }) => ({ figureId, svg })),
          signal,
        }),
      ]);
      return { view, report };
    }),
  ];
}
