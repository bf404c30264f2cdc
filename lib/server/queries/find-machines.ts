import 'server-only';
import type { FoundMachines } from '@/lib/schemas/found-machines';
import { query } from '../query';

const SQL = `
  select m.id, m.tag, m.name, s.name as "siteName"
    from machine m join site s on s.id = m.site_id
   where m.site_id in (?)
     and (m.tag_key like ? or lower(replace(m.name, ' ', '')) like ?
          or lower(replace(array_to_string(m.aliases, '|'), ' ', '')) like ?)
   order by m.tag_key not like ?, m.state, m.tag
   limit 12`;

/** Machines whose tag, name or an older tag holds the text, whatever its case and spaces. */
export const findMachines = query(
  'register:read',
  async ({ em, siteIds }, text: string): Promise<FoundMachines> => {
    const wanted = text
      .toLowerCase()
      .replace(/\s+/g, '')
      .replace(/[\\%_]/g, '\\$&');
    if (wanted === '') return { machines: [] };
    const anywhere = `%${wanted}%`;
    const machines = await em
      .getConnection()
      .execute<FoundMachines['machines']>(SQL, [
        siteIds,
        anywhere,
        anywhere,
        anywhere,
        `${wanted}%`,
      ]);
    return { machines };
  },
);
