import {
  addElementSet,
  createTarget,
  type Database,
  ElementSetInput,
  type ElementSetView,
  getTarget,
  listElementSets,
  listTargets,
  TargetChange,
  TargetInput,
  type TargetView,
  updateTarget,
} from '#club';
import { Body, Controller, Get, Param, Patch, Post, Res } from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { OpenDatabase } from '../database';
import { type Reply } from '../http';
import { created } from './created';

/** A choice of kinds, which no class can extend; the documentation needs a name for it all the same. */
const TargetBody = createZodDto(TargetInput);
Object.defineProperty(TargetBody, 'name', { value: 'TargetBody' });
class TargetChangeBody extends createZodDto(TargetChange) {}
class ElementSetBody extends createZodDto(ElementSetInput) {}

/** What can be promised to the public, and the orbits of what moves. */
@ApiTags('targets')
@Controller('api/targets')
export class TargetsController {
  constructor(@OpenDatabase() private readonly database: Database) {}

  @Get()
  @ApiOperation({ summary: 'All targets' })
  list(): Promise<readonly TargetView[]> {
    return listTargets(this.database);
  }

  @Get(':target')
  @ApiOperation({ summary: 'One target, by id or name' })
  get(@Param('target') target: string): Promise<TargetView> {
    return getTarget(this.database, target);
  }

  @Post()
  @ApiBody({ type: TargetBody })
  @ApiOperation({ summary: 'Enter a target; one on an orbit with its first element set' })
  async create(@Body() body: TargetInput, @Res({ passthrough: true }) reply: Reply): Promise<TargetView> {
    return created(reply, 'targets', await createTarget(this.database, body));
  }

  @Patch(':target')
  @ApiBody({ type: TargetChangeBody })
  @ApiOperation({ summary: "Change a target's name, words or coma" })
  update(@Param('target') target: string, @Body() body: TargetChange): Promise<TargetView> {
    return updateTarget(this.database, target, body);
  }

  @Get(':target/element-sets')
  @ApiOperation({ summary: 'Every element set of a target, newest first' })
  elementSets(@Param('target') target: string): Promise<readonly ElementSetView[]> {
    return listElementSets(this.database, target);
  }

  @Post(':target/element-sets')
  @ApiBody({ type: ElementSetBody })
  @ApiOperation({ summary: 'Add a newer element set; the older ones are kept' })
  addElementSet(@Param('target') target: string, @Body() body: ElementSetInput): Promise<ElementSetView> {
    return addElementSet(this.database, target, body);
  }
}
