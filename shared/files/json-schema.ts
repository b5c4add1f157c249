import { z } from 'zod';

import { DesignFile } from '#shared/kinds/design-file.ts';
import { FORMAT_VERSION } from '#shared/model/design.ts';

/**
 * The published JSON Schema (draft 2020-12) of `*.ampwright.json`, made from the schema that reads the files. What
 * no schema can say (keys equal to ids, everything named is there) is checked on reading.
 */
export function designJsonSchema(): Record<string, unknown> {
  const { $schema, ...schema } = z.toJSONSchema(DesignFile, { io: 'input', reused: 'inline' });
  return {
    $schema,
    $id: `urn:ampwright:design:${FORMAT_VERSION}`,
    title: 'Ampwright design',
    description:
      'The electrical system of one boat. SI units: metres, volts, amperes, watts; milliohms and degrees Celsius where the key says so. ' +
      'Places are in sheet units of 0.4375 mm from the upper left of the paper. Ids are unique within their record and equal to their key.',
    ...schema,
  };
}
