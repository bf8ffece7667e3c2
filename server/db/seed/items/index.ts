import { circularPathItems } from './circular-paths.ts';
import { crossedFieldItems } from './crossed-fields.ts';
import { deflectingPlateItems } from './deflecting-plates.ts';
import type { DemoItem } from './demo-item.ts';
import { electronGunItems } from './electron-guns.ts';
import { matterWaveItems } from './matter-waves.ts';
import { oilDropItems } from './oil-drops.ts';
import { photoelectricItems } from './photoelectric-effect.ts';
import { photonItems } from './photons-and-levels.ts';
import { quantisedChargeItems } from './quantised-charge.ts';

/** Every item of the demo, topic by topic; all invented. */
export const demoItems: readonly DemoItem[] = [
  ...electronGunItems,
  ...crossedFieldItems,
  ...circularPathItems,
  ...deflectingPlateItems,
  ...oilDropItems,
  ...quantisedChargeItems,
  ...photoelectricItems,
  ...photonItems,
  ...matterWaveItems,
];
