import {
  createProgramme,
  type Database,
  getProgramme,
  listProgrammes,
  updateProgramme,
  ProgrammeInput,
  type ProgrammeView,
} from '#club';
import { Body, Controller, Get, Param, Patch, Post, Res } from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';
import { OpenDatabase } from '../database';
import { type Reply } from '../http';
import { created } from './created';

class ProgrammeBody extends createZodDto(ProgrammeInput) {}
class ProgrammeChangeBody extends createZodDto(z.strictObject(ProgrammeInput.shape).partial()) {}

/** The targets promised, and what the club wishes of an evening. */
@ApiTags('programmes')
@Controller('api/programmes')
export class ProgrammesController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get()
  @ApiOperation({ summary: 'All programmes' })
  list(): Promise<readonly ProgrammeView[]> {
    return listProgrammes(this.database);
  }

  @Get(':programme')
  @ApiOperation({ summary: 'One programme, by id or name' })
  get(@Param('programme') programme: string): Promise<ProgrammeView> {
    return getProgramme(this.database, programme);
  }

  @Post()
  @ApiBody({ type: ProgrammeBody })
  @ApiOperation({ summary: 'Enter a programme' })
  async create(
    @Body() body: ProgrammeInput,
    @Res({ passthrough: true }) reply: Reply,
  ): Promise<ProgrammeView> {
    return created(reply, 'programmes', await createProgramme(this.database, body));
  }

  @Patch(':programme')
  @ApiBody({ type: ProgrammeChangeBody })
  @ApiOperation({ summary: 'Change some fields of a programme; lists are replaced whole' })
  update(
    @Param('programme') programme: string,
    @Body() body: Partial<ProgrammeInput>,
  ): Promise<ProgrammeView> {
    return updateProgramme(this.database, programme, body);
  }
}
