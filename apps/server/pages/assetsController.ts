import { projectRoot } from '#club';
import { Controller, Get, NotFoundException, Param, Res } from '@nestjs/common';
import { ApiExcludeController } from '@nestjs/swagger';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { type Reply } from '../http';
import { STYLE } from './style';

const FONTS: ReadonlySet<string> = new Set([
  'GentiumPlus-Regular.ttf',
  'NotoSans-Regular.ttf',
  'NotoSans-Bold.ttf',
]);

const FOR_GOOD = 'public, max-age=31536000, immutable';

/** A half-disc over a line: something that has just risen. */
const ICON =
  '<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 16 16"><path fill="#f8f4ea" d="M0 0h16v16H0z"/>' +
  '<path fill="#7d3414" d="M3 11a5 5 0 0 1 10 0zM1 12h14v1H1z"/></svg>';

/** What the pages are dressed in. */
@ApiExcludeController()
@Controller()
export class AssetsController {
  @Get('style.css')
  style(@Res() reply: Reply): void {
    reply.setHeader('Cache-Control', FOR_GOOD).type('text/css').send(STYLE);
  }

  @Get('icon.svg')
  icon(@Res() reply: Reply): void {
    reply.setHeader('Cache-Control', FOR_GOOD).type('image/svg+xml').send(ICON);
  }

  @Get('fonts/:file')
  async font(@Param('file') file: string, @Res() reply: Reply): Promise<void> {
    if (!FONTS.has(file)) throw new NotFoundException('There is no such font here.');
    const body = await readFile(join(projectRoot, 'libs', 'charts', 'fonts', file));
    reply.setHeader('Cache-Control', FOR_GOOD).setHeader('Content-Type', 'font/ttf').send(body);
  }
}
