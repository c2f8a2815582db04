import {
  addElementSet,
  addElementText,
  type BodyTrust,
  type ChangeNotice,
  checked,
  createTarget,
  type Database,
  elementChanges,
  ElementSetInput,
  type ElementSetView,
  ElementText,
  getTarget,
  listElementSets,
  listTargets,
  type LoadedElements,
  type RenewedTarget,
  TargetChange,
  TargetInput,
  targetTrust,
  type TargetView,
  TrustInput,
  updateTarget,
} from '#club';
import { Body, Controller, Get, Param, Patch, Post, Query, Res } from '@nestjs/common';
import { ApiBody, ApiOperation, ApiTags } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';
import { OpenDatabase } from '../database';
import { type Reply } from '../http';
import { created } from './created';

/** A choice of kinds, which no class can extend; the documentation needs a name for it all the same. */
const TargetBody = createZodDto(TargetInput);
Object.defineProperty(TargetBody, 'name', { value: 'TargetBody' });
class TargetChangeBody extends createZodDto(TargetChange) {}
/** Elements by their fields, or a text of element sets. */
const ElementsBody = createZodDto(z.union([ElementSetInput, ElementText]));
Object.defineProperty(ElementsBody, 'name', { value: 'ElementsBody' });
class TrustQuery extends createZodDto(TrustInput) {}

/** An element set that was added, with what it changes. */
type AddedElements = ElementSetView & Omit<RenewedTarget, 'set'>;

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
  @ApiBody({ type: ElementsBody })
  @ApiOperation({
    summary: 'Add newer elements, by their fields or as text; the older ones are kept',
    description:
      "Fields as `elements check` prints them, or `text`: lines of the Minor Planet Center's formats, CSV or JSON, " +
      'of which the sets of this target are taken; bad lines come back as problems. The answer says what the new ' +
      'elements change in the coming evenings.',
  })
  async addElements(
    @Param('target') target: string,
    @Body() body: ElementSetInput | ElementText,
  ): Promise<AddedElements | LoadedElements> {
    if (isText(body)) return addElementText(this.database, target, body);
    const { set, ...rest } = await addElementSet(this.database, target, body);
    return { ...set, ...rest };
  }

  @Get(':target/changes')
  @ApiOperation({
    summary: 'What the newest element set changes in the coming evenings, beside the one before it',
    description: '`change` is null where the target has only one set.',
  })
  async changes(@Param('target') target: string): Promise<{ readonly change: ChangeNotice | null }> {
    return { change: await elementChanges(this.database, target) };
  }

  @Get(':target/trust')
  @ApiOperation({ summary: "How far a comet's or asteroid's place can be trusted on the evening of a date" })
  trust(@Param('target') target: string, @Query() query: TrustQuery): Promise<BodyTrust> {
    return targetTrust(this.database, target, checked(TrustInput, query));
  }
}

function isText(body: ElementSetInput | ElementText | null | undefined): body is ElementText {
  return typeof body === 'object' && body !== null && 'text' in body;
}
