import { chartForEvent, checked, type Database } from '#club';
import { Controller, Get, Param, Query, Res } from '@nestjs/common';
import { ApiOperation, ApiProduces, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';
import { OpenDatabase } from '../database';
import { type Reply, sendSheet } from '../http';

const FIELD_RIGHT = 'degrees from 0.1 to 120';

const ChartQuery = z.strictObject({
  scale: z.enum(['eye', 'binocular', 'eyepiece']),
  format: z.enum(['pdf', 'svg']).default('pdf'),
  paper: z.enum(['a4', 'letter']).optional(),
  /** Width of the field in degrees; left out: the scale's usual one. */
  field: z.coerce
    .number({ error: FIELD_RIGHT })
    .min(0.1, { error: FIELD_RIGHT })
    .max(120, { error: FIELD_RIGHT })
    .optional(),
  orientation: z.enum(['upright', 'rotated', 'mirrored']).optional(),
});

class ChartQueryDto extends createZodDto(ChartQuery) {}

/** The finder charts of an event. */
@ApiTags('charts')
@Controller('api/events/:id/charts')
export class ChartsController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get(':target')
  @ApiProduces('application/pdf', 'image/svg+xml')
  @ApiOperation({ summary: "The finder chart of a target of the event's programme, for the event" })
  async draw(
    @Param('id') eventId: string,
    @Param('target') target: string,
    @Query() query: ChartQueryDto,
    @Res() reply: Reply,
  ): Promise<void> {
    const { field: fieldDeg, ...wishes } = checked(ChartQuery, query);
    sendSheet(reply, await chartForEvent(this.database, { eventId, target, ...wishes, fieldDeg }));
  }
}
