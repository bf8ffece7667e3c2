/** Mixes 32 bits thoroughly (the finaliser of MurmurHash3, A. Appleby, in the public domain). */
function mix(bits: number): number {
  let hash = bits | 0;
  hash = Math.imul(hash ^ (hash >>> 16), 0x85ebca6b);
  hash = Math.imul(hash ^ (hash >>> 13), 0xc2b2ae35);
  return (hash ^ (hash >>> 16)) | 0;
}

/** A seed of 32 bits from a name. */
export function seedOfName(name: string): number {
  let hash = 0x811c9dc5;
  for (let index = 0; index < name.length; index += 1) {
    hash = Math.imul(hash ^ name.charCodeAt(index), 0x01000193);
  }
  return mix(hash);
}

/** A uniform number in (0, 1) from a seed, a draw number and a counter. */
function uniform(seed: number, draw: number, counter: number): number {
  const low = draw % 4294967296;
  const high = Math.floor(draw / 4294967296);
  const hash = mix(mix(mix(seed ^ low) ^ high) + Math.imul(counter, 0x9e3779b9));
  return ((hash >>> 0) + 0.5) / 4294967296;
}

/** A standard Gaussian number that depends on name, draw number and element alone (Box and Muller, 1958). */
export function gaussian(seed: number, draw: number, element: number): number {
  const radius = Math.sqrt(-2 * Math.log(uniform(seed, draw, 2 * element)));
  return radius * Math.cos(2 * Math.PI * uniform(seed, draw, 2 * element + 1));
}
