import { tasks as customers } from './customers/jobs';
import { tasks as donors } from './donors/jobs';
import { tasks as parts } from './parts/jobs';
import { tasks as people } from './people/jobs';
import { tasks as photos } from './photos/jobs';
import { tasks as wants } from './wants/jobs';

/** Table of contents of the background work. */
export const tasks = [...people, ...photos, ...donors, ...parts, ...customers, ...wants];
