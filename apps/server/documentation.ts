import { programVersion } from '#club';
import { type NestExpressApplication } from '@nestjs/platform-express';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';
import { cleanupOpenApiDoc } from 'nestjs-zod';

/** `/api/docs` for people, `/api/openapi.json` for programs. */
export function documentApi(application: NestExpressApplication): void {
  const outline = new DocumentBuilder()
    .setTitle('Duskwright')
    .setDescription(
      'Public viewing evenings of an astronomy club: sites, programmes, the evenings worth holding, events, charts. ' +
        'Angles in degrees, longitudes east-positive, instants as ISO 8601. What is refused comes as an RFC 9457 ' +
        'problem whose `problems` name field, value and what would be right.',
    )
    .setVersion(programVersion())
    .addGlobalResponse(
      refusal(400, 'The request is wrong; its fields are named.'),
      refusal(404, 'What it names does not exist.'),
      refusal(409, 'It does not fit what there is.'),
    )
    .build();
  SwaggerModule.setup(
    'api/docs',
    application,
    () => cleanupOpenApiDoc(SwaggerModule.createDocument(application, outline)),
    {
      jsonDocumentUrl: 'api/openapi.json',
      raw: ['json'],
      customSiteTitle: 'Duskwright: the API',
      customCss: '.topbar { display: none }',
    },
  );
}

/** How every refusal looks. */
function refusal(status: number, description: string) {
  const text = { type: 'string' };
  const schema = {
    type: 'object',
    required: ['type', 'title', 'status', 'detail', 'problems'],
    properties: {
      type: text,
      title: text,
      status: { type: 'integer' },
      detail: text,
      problems: {
        type: 'array',
        items: {
          type: 'object',
          required: ['field', 'message'],
          properties: { field: text, value: {}, message: text },
        },
      },
    },
  };
  return { status, description, content: { 'application/problem+json': { schema } } };
}
