import { useEffect, useState } from 'react';

import { getFigureContent } from '#shared/contracts/figures.ts';
import type { Block, SheetFigure } from '#shared/sheet/model.ts';
import { Inlines } from './Inlines.tsx';
import { Maths } from './Maths.tsx';

/** The address of a picture; an SVG with its values filled in becomes a picture of its own. */
function usePictureAddress(figure: SheetFigure): string | undefined {
  const { svg, figureId } = figure;
  const [address, setAddress] = useState<string>();
  useEffect(() => {
    if (svg === null) {
      setAddress(getFigureContent.path.replace(':figureId', String(figureId)));
      return undefined;
    }
    const made = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }));
    setAddress(made);
    return () => URL.revokeObjectURL(made);
  }, [svg, figureId]);
  return address;
}

function Figure({ figure }: { figure: SheetFigure }) {
  const address = usePictureAddress(figure);
  return (
    <figure className="sheet-figure" style={{ width: `${figure.widthPercent}%` }}>
      {address !== undefined && (
        <img src={address} alt={figure.alternativeText} width={figure.width} height={figure.height} />
      )}
      {figure.caption !== '' && <figcaption>{figure.caption}</figcaption>}
    </figure>
  );
}

/** The blocks of a text, as they print. */
export function Blocks({ blocks }: { blocks: readonly Block[] }) {
  return blocks.map((block, index) => {
    switch (block.kind) {
      case 'paragraph':
        return (
          <p key={index}>
            <Inlines inlines={block.children} />
          </p>
        );
      case 'maths':
        return (
          <div key={index} className="sheet-maths">
            <Maths latex={block.latex} display />
          </div>
        );
      case 'list': {
        const List = block.ordered ? 'ol' : 'ul';
        return (
          <List key={index}>
            {block.items.map((item, at) => (
              <li key={at}>
                <Blocks blocks={item} />
              </li>
            ))}
          </List>
        );
      }
      case 'table':
        return (
          <table key={index} className="sheet-table">
            <thead>
              <tr>
                {block.header.map((cell, at) => (
                  <th key={at} scope="col">
                    <Inlines inlines={cell} />
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {block.rows.map((row, at) => (
                <tr key={at}>
                  {row.map((cell, column) => (
                    <td key={column}>
                      <Inlines inlines={cell} />
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        );
      case 'figure':
        return <Figure key={index} figure={block.figure} />;
    }
  });
}
