import { FIGURE_MAX_BYTES, FIGURE_TYPES } from '#shared/contracts/figures.ts';

/** Why a file cannot be a figure, before it is sent; null when it may be tried. The server looks at the content. */
export function fileRefusal(file: Pick<File, 'name' | 'size' | 'type'>): string | null {
  if (file.size > FIGURE_MAX_BYTES) {
    const megabytes = (file.size / (1024 * 1024)).toFixed(1);
    return `${file.name} has ${megabytes} MB; a figure may have 4 MB at most.`;
  }
  if (file.size === 0) return `${file.name} is empty.`;
  if (file.type !== '' && !FIGURE_TYPES.some((type) => type === file.type)) {
    return `${file.name} is neither PNG, JPEG nor SVG.`;
  }
  return null;
}

/** The first picture among what was dropped or pasted. */
export function pictureOf(files: Iterable<File>): File | null {
  const list = [...files];
  return list.find((file) => file.type.startsWith('image/')) ?? list[0] ?? null;
}
