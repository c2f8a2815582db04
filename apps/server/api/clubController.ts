import {
  ClubDateInput,
  type ClubDateView,
  ClubInput,
  type ClubView,
  createClubDate,
  type Database,
  getClub,
  listClubDates,
  updateClub,
} from '#club';
import { Body, Controller, Get, Patch, Post } from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { OpenDatabase } from '../database';

class ClubChangeBody extends createZodDto(ClubInput.partial()) {}
class ClubDateBody extends createZodDto(ClubDateInput) {}

/** The club's settings and its other dates. */
@ApiTags('club')
@Controller('api')
export class ClubController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get('club')
  @ApiOperation({ summary: "The club's settings" })
  club(): Promise<ClubView> {
    return getClub(this.database);
  }

  @Patch('club')
  @ApiBody({ type: ClubChangeBody })
  @ApiOperation({ summary: "Change some of the club's settings" })
  updateClub(@Body() body: Partial<ClubInput>): Promise<ClubView> {
    return updateClub(this.database, body);
  }

  @Get('club-dates')
  @ApiOperation({ summary: 'Dates on which the club does something else' })
  dates(): Promise<readonly ClubDateView[]> {
    return listClubDates(this.database);
  }

  @Post('club-dates')
  @ApiBody({ type: ClubDateBody })
  @ApiOperation({ summary: 'Enter a date on which the club does something else' })
  addDate(@Body() body: ClubDateInput): Promise<ClubDateView> {
    return createClubDate(this.database, body);
  }
}
