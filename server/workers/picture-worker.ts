import { dispatcher } from './dispatcher.ts';
import { inspectPicture } from './picture-tasks/inspect-picture.ts';

/** What the pictures' thread can be asked for. */
export default dispatcher({ inspect: inspectPicture });
