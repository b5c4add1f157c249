import { customType, datetime } from 'drizzle-orm/mysql-core';

/** UUIDv7, made in the application. Compared byte by byte. */
export const uuid = customType<{ data: string }>({
  dataType: () => 'varchar(36) character set ascii collate ascii_bin',
});

/** An entity's key in its design: `a` and `A` are two. */
export const entityKey = customType<{ data: string }>({
  dataType: () => 'varchar(64) character set ascii collate ascii_bin',
});

/** Text compared byte by byte, for keys that are not only ASCII. */
export const exactText = customType<{ data: string }>({
  dataType: () => 'varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin',
});

/** UTC to the millisecond. */
export function instant(name: string) {
  return datetime(name, { mode: 'date', fsp: 3 });
}
