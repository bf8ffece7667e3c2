import * as contracts from '#shared/contracts/figures.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { FileReply } from '../../http/file-reply.ts';
import { type Route, route } from '../../http/route.ts';
import { addFigure, figureContent, listFigures } from './service.ts';

/** A picture is shown by itself with nothing allowed to run or load, whatever it holds. */
const PICTURE_HEADERS = {
  'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; sandbox",
  'x-content-type-options': 'nosniff',
  'cache-control': 'private, max-age=31536000, immutable',
};

/** Figures of items. */
export function figureRoutes(context: AppContext): Route[] {
  return [
    route(contracts.listFigures, { can: 'item.read' }, ({ actor, params }) =>
      listFigures(context, actor, params.itemId),
    ),
    route(
      contracts.uploadFigure,
      { can: 'item.edit', uploadBytes: contracts.FIGURE_MAX_BYTES },
      ({ actor, params, file, signal }) => {
        if (file === null) throw new AppError('badRequest', 'Choose a picture to add.');
        return addFigure(context, actor, params.itemId, file, signal);
      },
    ),
    route(contracts.getFigureContent, { can: 'signedIn' }, async ({ actor, params }) => {
      const { bytes, mediaType } = await figureContent(context, actor, params.figureId);
      return new FileReply(bytes, mediaType, { headers: PICTURE_HEADERS });
    }),
  ];
}
