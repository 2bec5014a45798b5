import 'server-only';
import { QueryTypes } from 'sequelize';
import { variantLabel } from '@/lib/catalogue/rules';
import { database } from '@/lib/platform/database/connection';
import type { Claim } from './schema';

interface ClaimRow extends Omit<Claim, 'variant' | 'mode' | 'source'> {
  variantId: number | null;
  generation: string | null;
  region: string | null;
  modeCode: string | null;
  modeName: string | null;
  sourceTitle: string;
  sourceAddress: string | null;
  sourcePage: string | null;
  readOn: string;
}

/** What is claimed of a device and not superseded, in the order it was recorded. */
export async function claimsOfDevice(deviceId: number): Promise<Claim[]> {
  const rows = await database().sequelize.query<ClaimRow>(
    `select c.public_id as "publicId", r.n as revision, c.state, c.variant_id as "variantId", v.generation, v.region,
            r.kind, r.lower, r.upper, r.single_value as "singleValue", r.last_digit as "lastDigit",
            r.tolerance_percent as "tolerancePercent", r.unit, r.uses_per_year as "usesPerYear", r.term, r.definition,
            m.code as "modeCode", m.name as "modeName", r.mode_reason as "modeReason",
            r.contradicts_mode as "contradictsMode", r.ambient_celsius as "ambientCelsius",
            r.source_title as "sourceTitle", r.source_address as "sourceAddress", r.source_page as "sourcePage",
            to_char(r.read_on, 'YYYY-MM-DD') as "readOn"
     from claim c
     join claim_revision r on r.id = c.current_revision_id
     left join operating_mode m on m.id = r.mode_id
     left join variant v on v.id = c.variant_id
     where c.device_id = $1 and c.state <> 'superseded'
     order by c.id`,
    { bind: [deviceId], type: QueryTypes.SELECT },
  );
  return rows.map(toClaim);
}

function toClaim(row: ClaimRow): Claim {
  const { variantId, generation, region, modeCode, modeName, sourceTitle, sourceAddress, sourcePage, readOn, ...rest } =
    row;
  return {
    ...rest,
    variant:
      variantId !== null && generation !== null ? { id: variantId, label: variantLabel({ generation, region }) } : null,
    mode: modeCode !== null && modeName !== null ? { code: modeCode, name: modeName } : null,
    source: { title: sourceTitle, address: sourceAddress, page: sourcePage, readOn },
  };
}
