import { MISTAKE } from '$lib/parts/state';
import { sql } from 'drizzle-orm';
import { donor } from '../donors/tables';
import { part } from '../parts/tables';
import { want, wantMatch } from './tables';

/** A match whose part is still to be had, or whose donor still carries the kind; `m` and `w` as they are named here. */
export const live = sql`m.dropped_at is null and (
	exists (select from ${part} p where p.shop_id = m.shop_id and p.id = m.part_id
		and p.state in ('pulled', 'shelved', 'back'))
	or exists (select from ${donor} d where d.shop_id = m.shop_id and d.id = m.donor_id
		and d.state in ('whole', 'on the bench', 'parked')
		and not exists (select from ${part} q where q.shop_id = m.shop_id and q.donor_id = d.id and q.kind = w.kind
			and q.scrap_reason is distinct from ${MISTAKE})))`;

/** Nobody has looked at it, and the want is still looked out for. */
export const fresh = sql`m.seen_at is null and ${live}`;

/** The wants still looked out for, beside their matches. */
export const matches = sql`${wantMatch} m join ${want} w on w.shop_id = m.shop_id and w.id = m.want_id`;
