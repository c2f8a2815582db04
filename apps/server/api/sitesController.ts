import { createSite, type Database, getSite, listSites, updateSite, SiteInput, type SiteView } from '#club';
import { Body, Controller, Get, Param, Patch, Post, Res } from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';
import { OpenDatabase } from '../database';
import { type Reply } from '../http';
import { created } from './created';

class SiteBody extends createZodDto(SiteInput) {}
class SiteChangeBody extends createZodDto(z.strictObject(SiteInput.shape).partial()) {}

/** The club's dark sites. */
@ApiTags('sites')
@Controller('api/sites')
export class SitesController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get()
  @ApiOperation({ summary: 'All sites' })
  list(): Promise<readonly SiteView[]> {
    return listSites(this.database);
  }

  @Get(':site')
  @ApiOperation({ summary: 'One site, by id or name' })
  get(@Param('site') site: string): Promise<SiteView> {
    return getSite(this.database, site);
  }

  @Post()
  @ApiBody({ type: SiteBody })
  @ApiOperation({ summary: 'Enter a site' })
  async create(@Body() body: SiteInput, @Res({ passthrough: true }) reply: Reply): Promise<SiteView> {
    return created(reply, 'sites', await createSite(this.database, body));
  }

  @Patch(':site')
  @ApiBody({ type: SiteChangeBody })
  @ApiOperation({ summary: 'Change some fields of a site; lists are replaced whole' })
  update(@Param('site') site: string, @Body() body: Partial<SiteInput>): Promise<SiteView> {
    return updateSite(this.database, site, body);
  }
}
