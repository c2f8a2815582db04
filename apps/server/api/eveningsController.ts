import { checked, type Database, EveningInput, type EveningJson, eveningJson, judgeEvening } from '#club';
import { Controller, Get, Query } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { OpenDatabase } from '../database';

class EveningQuery extends createZodDto(EveningInput) {}

/** Single evenings, judged on request. */
@ApiTags('evenings')
@Controller('api/evenings')
export class EveningsController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get()
  @ApiOperation({ summary: 'One evening at one site, judged for a programme' })
  async judge(@Query() query: EveningQuery): Promise<EveningJson> {
    return eveningJson(await judgeEvening(this.database, checked(EveningInput, query)));
  }
}
