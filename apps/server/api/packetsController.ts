import { checked, type Database, listPackets, PacketInput, type PacketView, printPacket } from '#club';
import { Body, Controller, Get, HttpCode, Param, Post, Res } from '@nestjs/common';
import { ApiOperation, ApiProduces, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { OpenDatabase } from '../database';
import { type Reply, sendSheet } from '../http';

const PacketWishes = PacketInput.omit({ eventId: true });

class PacketWishesDto extends createZodDto(PacketWishes) {}

/** The packets of printed sheets of an event, drawn in a worker. */
@ApiTags('packets')
@Controller('api/events/:id/packets')
export class PacketsController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get()
  @ApiOperation({ summary: 'The packets printed so far, and what has changed since' })
  list(@Param('id') eventId: string): Promise<readonly PacketView[]> {
    return listPackets(this.database, eventId);
  }

  @Post()
  @HttpCode(200)
  @ApiProduces('application/pdf')
  @ApiOperation({ summary: 'Prints the sheets of an event, all of them unless told otherwise' })
  async print(
    @Param('id') eventId: string,
    @Body() wishes: PacketWishesDto,
    @Res() reply: Reply,
  ): Promise<void> {
    sendSheet(reply, await printPacket(this.database, { eventId, ...checked(PacketWishes, wishes) }));
  }
}
