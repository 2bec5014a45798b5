import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import { INSTRUMENT_KINDS } from '@/lib/reports/schema';
import type { Queue, QueueItem } from '../schema';

const MOST_ITEMS = 200;

interface Row extends Omit<QueueItem, 'submittedAt' | 'instrument'> {
  submittedAt: Date;
  instrumentKind: keyof typeof INSTRUMENT_KINDS;
  instrumentModel: string;
}

/** What waits for a verdict, the longest first; of one category only where its address is given. */
export async function reviewQueue(memberId: number, categorySlug: string | null): Promise<Queue> {
  const { sequelize } = database();
  const rows = await sequelize.query<Row>(
    `select r.public_id as "publicId", v.n as revision, r.submitted_at as "submittedAt",
            jsonb_build_object('name', mk.name || ' ' || dev.model, 'isNew', dev.state = 'new') as device,
            jsonb_build_object('name', c.name, 'slug', cs.slug) as category,
            jsonb_build_object('publicId', m.public_id,
                               'name', coalesce(d.name, 'former member ' || m.former_number)) as member,
            ir.kind as "instrumentKind", ir.model_name as "instrumentModel",
            not exists (select 1 from report o where o.device_id = r.device_id and o.published_revision_id is not null
                        and o.state not in ('withdrawn', 'lapsed')) as "isFirstOfDevice",
            not exists (select 1 from report o where o.member_id = r.member_id
                        and o.published_revision_id is not null) as "isFirstOfMember",
            v.n > 1 as "isResubmitted", r.member_id = $1 as "isOwn"
     from report r
     join report_revision v on v.id = r.pending_revision_id
     join instrument_revision ir on ir.id = v.instrument_revision_id
     join device dev on dev.id = r.device_id
     join maker mk on mk.id = dev.maker_id
     join category c on c.id = dev.category_id
     join slug cs on cs.target_kind = 'category' and cs.target_id = c.id and cs.current
     join member m on m.id = r.member_id
     left join personal_detail d on d.member_id = m.id
     where r.state = 'submitted' and ($2::text is null or cs.slug = $2)
     order by r.submitted_at, r.id limit ${MOST_ITEMS}`,
    { bind: [memberId, categorySlug], type: QueryTypes.SELECT },
  );
  const categories = await sequelize.query<Queue['categories'][number] & { oldest: Date }>(
    `select c.name, cs.slug, count(*)::int as count, min(r.submitted_at) as oldest
     from report r
     join device dev on dev.id = r.device_id
     join category c on c.id = dev.category_id
     join slug cs on cs.target_kind = 'category' and cs.target_id = c.id and cs.current
     where r.state = 'submitted' group by c.id, cs.slug order by c.name`,
    { type: QueryTypes.SELECT },
  );
  const oldest = categories.map((category) => category.oldest.toISOString()).sort()[0];
  return {
    count: categories.reduce((total, category) => total + category.count, 0),
    oldestSubmittedAt: oldest ?? null,
    categories: categories.map(({ name, slug, count }) => ({ name, slug, count })),
    items: rows.map(({ submittedAt, instrumentKind, instrumentModel, ...item }) => ({
      ...item,
      submittedAt: submittedAt.toISOString(),
      instrument: `${INSTRUMENT_KINDS[instrumentKind]}, ${instrumentModel}`,
    })),
  };
}
