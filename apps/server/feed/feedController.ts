import { Controller, Get, Inject, Param, Req, Res } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { header, type Reply, type Request } from '../http';
import { type KeptFeed, KeptFeeds } from './keptFeeds';

/** The calendars that members subscribe to. */
@ApiTags('calendar')
@Controller()
export class FeedController {
  constructor(@Inject(KeptFeeds) private readonly feeds: KeptFeeds) {}

  @Get('calendar.ics')
  @ApiOperation({ summary: 'The calendar of all public evenings (iCalendar)' })
  async all(@Req() request: Request, @Res() reply: Reply): Promise<void> {
    sendCalendar(request, reply, await this.feeds.find());
  }

  @Get('sites/:site/calendar.ics')
  @ApiOperation({ summary: 'The calendar of the public evenings at one site (iCalendar)' })
  async ofSite(@Param('site') site: string, @Req() request: Request, @Res() reply: Reply): Promise<void> {
    sendCalendar(request, reply, await this.feeds.find(site));
  }
}

/** Readers ask again and again; they get the text only when it has changed. */
function sendCalendar(request: Request, reply: Reply, { body, etag }: KeptFeed): void {
  reply.setHeader('ETag', etag).setHeader('Cache-Control', 'no-cache');
  if (knows(header(request, 'if-none-match'), etag)) {
    reply.status(304).send();
    return;
  }
  // As bytes, so that the framework adds no tag or character set of its own.
  reply.setHeader('Content-Type', 'text/calendar; charset=utf-8').send(body);
}

/** The weak comparison of RFC 9110, 13.1.2. */
function knows(ifNoneMatch: string | undefined, etag: string): boolean {
  if (ifNoneMatch === undefined) return false;
  return ifNoneMatch.split(',').some((tag) => ['*', etag, `W/${etag}`].includes(tag.trim()));
}
