import { checked, type Database, getProgramme, getSite, SeasonInput } from '#club';
import {
  Body,
  Controller,
  Delete,
  Get,
  HttpCode,
  Inject,
  NotFoundException,
  Param,
  Post,
  Res,
} from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { OpenDatabase } from '../database';
import { type Reply } from '../http';
import { SearchJobs, type SearchView } from './searchJobs';

class SeasonBody extends createZodDto(SeasonInput) {}

/** Evenings given in full where the request does not say how many, and at most. */
const USUAL_LIMIT = 60;
const HIGHEST_LIMIT = 500;

/** Searches for the evenings worth holding: started, looked at, cancelled. */
@ApiTags('searches')
@Controller('api/searches')
export class SearchesController {
  constructor(
    @OpenDatabase() private readonly database: Database,
    @Inject(SearchJobs) private readonly jobs: SearchJobs,
  ) {}

  @Post()
  @HttpCode(202)
  @ApiBody({ type: SeasonBody })
  @ApiOperation({ summary: 'Start a search; Location says where to look for its progress and result' })
  async start(@Body() body: unknown, @Res({ passthrough: true }) reply: Reply): Promise<SearchView> {
    const request = checked(SeasonInput, body);
    for (const name of request.siteNames ?? []) await getSite(this.database, name, 'siteNames');
    if (request.programmeName !== undefined) {
      await getProgramme(this.database, request.programmeName, 'programmeName');
    }
    const limit = Math.min(request.limit ?? USUAL_LIMIT, HIGHEST_LIMIT);
    const search = this.jobs.start({ ...request, limit });
    reply.setHeader('Location', `/api/searches/${search.id}`);
    return search;
  }

  @Get(':id')
  @ApiOperation({ summary: "A search's progress and, when it is done, its result" })
  get(@Param('id') id: string): SearchView {
    const search = this.jobs.find(id);
    if (search === null) throw new NotFoundException('There is no such search, or it is long over.');
    return search;
  }

  @Delete(':id')
  @HttpCode(204)
  @ApiOperation({ summary: 'Cancel a search' })
  cancel(@Param('id') id: string): void {
    if (!this.jobs.cancel(id)) throw new NotFoundException('There is no such search, or it is long over.');
  }
}
