import {
  type BodyChange,
  type BodyTrust,
  callOffEvent,
  CallOff,
  changeEvent,
  type Database,
  EventChange,
  eventChanges,
  EventInput,
  eventTrust,
  getEvent,
  listEvents,
  makeEvent,
  publishEvent,
} from '#club';
import { Body, Controller, Get, HttpCode, Param, Patch, Post, Res } from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { OpenDatabase } from '../database';
import { type Reply } from '../http';
import { created } from './created';
import { eventJson, type EventJson } from './eventJson';

class EventBody extends createZodDto(EventInput) {}
class EventChangeBody extends createZodDto(EventChange) {}
class CallOffBody extends createZodDto(CallOff) {}

/** The evenings the club holds, from draft to called off. */
@ApiTags('events')
@Controller('api/events')
export class EventsController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get()
  @ApiOperation({ summary: 'All events, earliest first' })
  async list(): Promise<readonly EventJson[]> {
    return (await listEvents(this.database)).map(eventJson);
  }

  @Get(':id')
  @ApiOperation({ summary: 'One event, with the evening it was made of and its history' })
  async get(@Param('id') id: string): Promise<EventJson> {
    return eventJson(await getEvent(this.database, id));
  }

  @Get(':id/trust')
  @ApiOperation({ summary: "How far the places of the event's comets and asteroids can be trusted" })
  trust(@Param('id') id: string): Promise<readonly BodyTrust[]> {
    return eventTrust(this.database, id);
  }

  @Get(':id/changes')
  @ApiOperation({ summary: 'What elements received since the evening was judged change in it' })
  async changes(@Param('id') id: string): Promise<readonly BodyChange[]> {
    await getEvent(this.database, id);
    return (await eventChanges(this.database, id)).get(id) ?? [];
  }

  @Post()
  @ApiBody({ type: EventBody })
  @ApiOperation({ summary: 'Make an event of an evening: a draft' })
  async make(@Body() body: EventInput, @Res({ passthrough: true }) reply: Reply): Promise<EventJson> {
    return created(reply, 'events', eventJson(await makeEvent(this.database, body)));
  }

  @Patch(':id')
  @ApiBody({ type: EventChangeBody })
  @ApiOperation({ summary: "Change an event's times or words" })
  async change(@Param('id') id: string, @Body() body: EventChange): Promise<EventJson> {
    return eventJson(await changeEvent(this.database, id, body));
  }

  @Post(':id/publish')
  @HttpCode(200)
  @ApiOperation({ summary: 'Show a draft to the public' })
  async publish(@Param('id') id: string): Promise<EventJson> {
    return eventJson(await publishEvent(this.database, id));
  }

  @Post(':id/call-off')
  @HttpCode(200)
  @ApiBody({ type: CallOffBody })
  @ApiOperation({ summary: 'Call an event off; it stays in the calendar as cancelled' })
  async callOff(@Param('id') id: string, @Body() body: CallOff): Promise<EventJson> {
    return eventJson(await callOffEvent(this.database, id, body));
  }
}
