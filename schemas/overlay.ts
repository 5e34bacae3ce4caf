/** What the overlay plot draws: everything selected, on the (energy, activity) plane. Lists of one length, one entry a point or cell. */
import { z } from 'zod';
import { namedSchema, pointCountsSchema, windowSchema } from './dataset-answers';
import { POINT_FLAGS } from './dataset-query';

const cellsSchema = z
  .strictObject({
    energyCell: z.array(z.int()),
    activityCell: z.array(z.int()),
    flag: z.array(z.enum(POINT_FLAGS)),
    points: z.array(z.int()),
  })
  .meta({
    id: 'OverlayCells',
    description: 'Cell i, j holds energies from i · grid.energy and activities from j · grid.activity',
  });

const pointListSchema = z
  .strictObject({
    dataset: z.array(z.int()).meta({ description: 'Place in `datasets`' }),
    series: z.array(z.int()).meta({ description: 'Place of the series in its document' }),
    point: z.array(z.int()).meta({ description: 'Place of the point in its series' }),
    energy: z.array(z.number()),
    activity: z.array(z.number()),
    expected: z.array(z.number()),
    z: z.array(z.number()),
    flag: z.array(z.enum(POINT_FLAGS)),
  })
  .meta({ id: 'OverlayPoints' });

export const overlaySchema = z
  .strictObject({
    counts: pointCountsSchema.extend({ datasets: z.int() }).meta({ id: 'OverlayCounts' }),
    window: windowSchema.nullable(),
    grid: z.strictObject({ energy: z.number(), activity: z.number() }),
    cells: cellsSchema,
    points: pointListSchema
      .nullable()
      .meta({ description: 'Every selected point, of all flags; null where there are more than 4,000' }),
    offCurve: z
      .strictObject({ total: z.int(), shown: z.int(), points: pointListSchema })
      .meta({ id: 'OverlayOffCurve', description: 'Off-curve points, the furthest 2,000 of `total`' }),
    datasets: z
      .array(
        z
          .strictObject({
            accession: z.string(),
            title: z.string(),
            lab: namedSchema,
            system: namedSchema,
            series: z.array(z.string()).meta({ description: 'Labels, by place in the document' }),
          })
          .meta({ id: 'OverlayDataset' }),
      )
      .meta({ description: 'The datasets that points refer to' }),
  })
  .meta({ id: 'Overlay' });

export type Overlay = z.infer<typeof overlaySchema>;
export type OverlayPoints = z.infer<typeof pointListSchema>;
export type OverlayCells = z.infer<typeof cellsSchema>;
