import { strFromU8, strToU8, unzipSync, type Zippable, zipSync } from 'fflate';

/** The date that every package and its properties carry; a document's own date stands in its text. */
const FIXED_DATE = '2000-01-01T00:00:00Z';
/** Zip times have no zone; this one lies within what the format can hold. */
const FIXED_TIME = new Date(2000, 0, 1, 0, 0, 0);

const CORE = 'docProps/core.xml';

/** Random relationship ids of hyperlinks and the like, in order of appearance. */
function renumber(text: string, names: Map<string, string>): string {
  return text.replace(/\brId([A-Za-z0-9_-]{10,})\b/g, (whole) => {
    let name = names.get(whole);
    if (name === undefined) names.set(whole, (name = `rIdx${names.size + 1}`));
    return name;
  });
}

/**
 * Gives an Office package the same bytes whenever its content is the same: fixed dates, parts in order, stable
 * ids, pictures stored as they are.
 */
export function normalisePackage(bytes: Uint8Array): Uint8Array {
  const parts = unzipSync(bytes);
  const names = new Map<string, string>();
  const ordered: Zippable = {};
  // The content types come first, as the packaging standard advises.
  const order = (name: string) => (name === '[Content_Types].xml' ? '' : name);
  for (const name of Object.keys(parts).sort((a, b) => (order(a) < order(b) ? -1 : 1))) {
    const part = parts[name];
    if (part === undefined || name.endsWith('/')) continue;
    const isText = /\.(xml|rels)$/.test(name);
    let content = part;
    if (isText) {
      let text = renumber(strFromU8(part), names);
      if (name === CORE) {
        text = text.replace(/(<dcterms:(created|modified)[^>]*>)[^<]*/g, `$1${FIXED_DATE}`);
      }
      content = strToU8(text);
    }
    ordered[name] = [content, { level: isText || name.endsWith('.svg') ? 6 : 0, mtime: FIXED_TIME }];
  }
  return zipSync(ordered);
}
