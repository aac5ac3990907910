import { tasks as parts } from './parts/jobs';
import { tasks as people } from './people/jobs';
import { tasks as photos } from './photos/jobs';

/** Table of contents of the background work. */
export const tasks = [...people, ...photos, ...parts];
