/** One thing that a value can stand for. */
export interface RoleOption {
  id: string;
  name: string;
  description: string;
}

/** Roles that fit what is typed: every word somewhere in name or description; names that begin so come first. */
export function matchingRoles(options: readonly RoleOption[], typed: string): RoleOption[] {
  const words = typed
    .toLowerCase()
    .split(/\s+/)
    .filter((word) => word !== '');
  const fits = options.filter((option) => {
    const text = `${option.name} ${option.description} ${option.id}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const begins = (option: RoleOption): number =>
    words[0] !== undefined && option.name.toLowerCase().startsWith(words[0]) ? 0 : 1;
  return fits.sort((a, b) => begins(a) - begins(b));
}
