import {
  createInstrument,
  type Database,
  getInstrument,
  listInstruments,
  updateInstrument,
  InstrumentInput,
  type InstrumentView,
} from '#club';
import { Body, Controller, Get, Param, Patch, Post, Res } from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';
import { OpenDatabase } from '../database';
import { type Reply } from '../http';
import { created } from './created';

class InstrumentBody extends createZodDto(InstrumentInput) {}
class InstrumentChangeBody extends createZodDto(z.strictObject(InstrumentInput.shape).partial()) {}

/** What the public looks with. */
@ApiTags('instruments')
@Controller('api/instruments')
export class InstrumentsController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get()
  @ApiOperation({ summary: 'All instruments' })
  list(): Promise<readonly InstrumentView[]> {
    return listInstruments(this.database);
  }

  @Get(':instrument')
  @ApiOperation({ summary: 'One instrument, by id or name' })
  get(@Param('instrument') instrument: string): Promise<InstrumentView> {
    return getInstrument(this.database, instrument);
  }

  @Post()
  @ApiBody({ type: InstrumentBody })
  @ApiOperation({ summary: 'Enter an instrument' })
  async create(
    @Body() body: InstrumentInput,
    @Res({ passthrough: true }) reply: Reply,
  ): Promise<InstrumentView> {
    return created(reply, 'instruments', await createInstrument(this.database, body));
  }

  @Patch(':instrument')
  @ApiBody({ type: InstrumentChangeBody })
  @ApiOperation({ summary: 'Change some fields of an instrument; lists are replaced whole' })
  update(
    @Param('instrument') instrument: string,
    @Body() body: Partial<InstrumentInput>,
  ): Promise<InstrumentView> {
    return updateInstrument(this.database, instrument, body);
  }
}
