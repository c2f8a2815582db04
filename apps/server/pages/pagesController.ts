import {
  callOffEvent,
  checked,
  type Database,
  type EventInput,
  getClub,
  getEvent,
  listEvents,
  listProgrammes,
  listSites,
  listTargets,
  makeEvent,
  printPacket,
  publishEvent,
  SeasonInput,
} from '#club';
import { Body, Controller, Get, Inject, Param, Post, Query, Req, Res } from '@nestjs/common';
import { ApiExcludeController } from '@nestjs/swagger';
import { DateTime } from 'luxon';
import { z } from 'zod';
import { OpenDatabase } from '../database';
import { header, type Reply, type Request, sendSheet } from '../http';
import { eventPage } from './eventPage';
import { frontPage } from './frontPage';
import { KeptNotes } from './keptNotes';
import { SeasonPages } from './seasonPages';

const SEASON_DAYS = 180;
const SHOWN = 15;
/** How long a reader waits for a search before the page comes without it; most take well under a second. */
const PATIENCE_MS = 5000;

const SHOW_RIGHT = 'a whole number from 1 to 200';

const FrontQuery = z.strictObject({
  from: z.string().optional(),
  to: z.string().optional(),
  programme: z.string().optional(),
  show: z.coerce
    .number({ error: SHOW_RIGHT })
    .int({ error: SHOW_RIGHT })
    .min(1, { error: SHOW_RIGHT })
    .max(200, { error: SHOW_RIGHT })
    .default(SHOWN),
});

/** The pages for people, and the forms on them. */
@ApiExcludeController()
@Controller()
export class PagesController {
  constructor(
    @OpenDatabase() private readonly database: Database,
    @Inject(SeasonPages) private readonly seasons: SeasonPages,
    @Inject(KeptNotes) private readonly notes: KeptNotes,
  ) {}

  @Get()
  async front(@Query() query: unknown, @Req() request: Request, @Res() reply: Reply): Promise<void> {
    const wishes = checked(FrontQuery, query);
    const club = await getClub(this.database);
    const [events, programmes, sites] = await Promise.all([
      listEvents(this.database),
      listProgrammes(this.database),
      listSites(this.database),
    ]);
    const nowMs = this.database.now().getTime();
    const today = DateTime.fromMillis(nowMs, { zone: sites[0]?.zone ?? 'utc' });
    const from = wishes.from ?? today.toISODate()!;
    const programmeName = wishes.programme ?? programmes[0]?.name;
    const open = programmeName !== undefined && sites.length > 0;
    const search = open
      ? {
          ...checked(SeasonInput, {
            from,
            to: wishes.to ?? seasonEnd(from),
            programmeName,
            limit: wishes.show,
          }),
          programmeName,
          limit: wishes.show,
        }
      : null;
    const ranking = search === null ? null : await this.seasons.find(search, PATIENCE_MS);
    const address = club.publicAddress ?? `http://${header(request, 'host') ?? 'localhost'}`;
    const calendarAddress = `${address}/calendar.ics`;
    const changes = await this.notes.allChanges();
    send(reply, frontPage({ club, events, changes, programmes, search, ranking, calendarAddress, nowMs }));
  }

  @Get('events/:id')
  async event(@Param('id') id: string, @Res() reply: Reply): Promise<void> {
    const event = await getEvent(this.database, id);
    const [club, targets, notes] = await Promise.all([
      getClub(this.database),
      listTargets(this.database),
      this.notes.ofEvent(event),
    ]);
    send(reply, eventPage(event, club, targets, notes));
  }

  @Post('events')
  async make(@Body() form: EventInput, @Res() reply: Reply): Promise<void> {
    const { id } = await makeEvent(this.database, form);
    reply.redirect(303, `/events/${id}`);
  }

  @Post('events/:id/publish')
  async publish(@Param('id') id: string, @Res() reply: Reply): Promise<void> {
    await publishEvent(this.database, id);
    reply.redirect(303, `/events/${encodeURIComponent(id)}`);
  }

  @Post('events/:id/packet')
  async packet(@Param('id') eventId: string, @Res() reply: Reply): Promise<void> {
    sendSheet(reply, await printPacket(this.database, { eventId }));
  }

  @Post('events/:id/call-off')
  async callOff(
    @Param('id') id: string,
    @Body() form: { readonly why: string },
    @Res() reply: Reply,
  ): Promise<void> {
    await callOffEvent(this.database, id, form);
    reply.redirect(303, `/events/${encodeURIComponent(id)}`);
  }
}

function send(reply: Reply, page: string): void {
  reply.setHeader('Cache-Control', 'no-cache').type('text/html').send(page);
}

/** The date half a year on. Where `from` is no date the search's own check says so, and of this nothing. */
function seasonEnd(from: string): string {
  return DateTime.fromISO(from, { zone: 'utc' }).plus({ days: SEASON_DAYS }).toISODate() ?? '2199-12-31';
}
