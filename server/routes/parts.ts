import { Router, type Request } from 'express';
import { Op, type WhereOptions } from 'sequelize';
import { readSignedIn, requireSignedIn } from '../auth/signed-in';
import { authorize, refuseNotFound, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam, parseQuery } from '../middleware/validate';
import { Part } from '../models/part';
import { decodePart, encodePart, nameOfPart } from '../models/part-codec';
import type { Actor } from '../policies/policy';
import { decodeCursor, encodeCursor } from '../presenters/page-cursor';
import { presentPart } from '../presenters/part';
import { idField } from '@/shared/api/fields';
import { partChangeRequest, partListQuery, partRequest, type PartContent } from '@/shared/api/parts';
import { LIMITS } from '@/shared/layout/limits';
import { escapeLike } from './escape-like';

const PAGE_LENGTH = 100;
const COPY_SUFFIX = ' (copy)';

/** /api/parts: the team's shelf of antennas and radios, by name. */
export function createPartsRouter(): Router {
  const router = Router();
  router.use(requireSignedIn);

  router.get('/', async (request, response) => {
    const { actor } = readSignedIn(request);
    authorize(actor, 'see-parts', actor);
    const query = parseQuery(partListQuery, request);
    const limit = query.limit ?? PAGE_LENGTH;
    const conditions: WhereOptions<Part['_attributes']>[] = [
      { teamId: actor.teamId },
      { archivedAt: query.archived === 'true' ? { [Op.ne]: null } : null },
    ];
    if (query.kind !== undefined) conditions.push({ kind: query.kind });
    if (query.search) conditions.push({ name: { [Op.like]: `%${escapeLike(query.search)}%` } });
    if (query.cursor !== undefined) conditions.push(readPosition(query.cursor));
    const parts = await Part.findAll({
      where: { [Op.and]: conditions },
      order: ['name', 'id'],
      limit: limit + 1,
    });
    const page = parts.slice(0, limit);
    const last = page.at(-1);
    response.json({
      items: page.map((part) => presentPart(actor, part)),
      next: parts.length > limit && last ? encodeCursor([last.name, last.id]) : null,
    });
  });

  router.post('/', async (request, response) => {
    const { actor } = readSignedIn(request);
    authorize(actor, 'edit-parts', actor);
    const { content } = parseBody(partRequest, request);
    const part = await Part.create({ teamId: actor.teamId, ...columnsOf(content) });
    response.status(201).json(presentPart(actor, part));
  });

  router.get('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const part = await findPart(request, actor);
    authorize(actor, 'see-parts', part);
    response.json(presentPart(actor, part));
  });

  router.put('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const part = await findPart(request, actor);
    authorize(actor, 'edit-parts', part);
    const { content } = parseBody(partRequest, request);
    await part.update(columnsOf(content));
    response.json(presentPart(actor, part));
  });

  router.patch('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const part = await findPart(request, actor);
    authorize(actor, 'edit-parts', part);
    const { archived } = parseBody(partChangeRequest, request);
    if (archived !== (part.archivedAt !== null))
      await part.update({ archivedAt: archived ? new Date() : null });
    response.json(presentPart(actor, part));
  });

  router.post('/:id/copy', async (request, response) => {
    const { actor } = readSignedIn(request);
    const part = await findPart(request, actor);
    authorize(actor, 'edit-parts', part);
    const copy = renamePart(decodePart(part.content), (name) => {
      return `${shorten(name, LIMITS.nameLength - COPY_SUFFIX.length)}${COPY_SUFFIX}`;
    });
    const created = await Part.create({ teamId: actor.teamId, ...columnsOf(copy) });
    response.status(201).json(presentPart(actor, created));
  });

  return router;
}

async function findPart(request: Request, actor: Actor): Promise<Part> {
  const id = parseParam(idField, request, 'id');
  const part = await Part.findOne({ where: { id, teamId: actor.teamId } });
  return part ?? refuseNotFound();
}

function columnsOf(content: PartContent) {
  return { kind: content.kind, name: nameOfPart(content), content: encodePart(content) };
}

function renamePart(content: PartContent, rename: (name: string) => string): PartContent {
  return content.kind === 'antenna'
    ? { kind: 'antenna', antenna: { ...content.antenna, name: rename(content.antenna.name) } }
    : { kind: 'radio', radio: { ...content.radio, name: rename(content.radio.name) } };
}

// A character of two halves is kept whole or left out.
function shorten(text: string, most: number): string {
  return text.slice(0, most).replace(/[\ud800-\udbff]$/, '');
}

function readPosition(cursor: string): WhereOptions<Part['_attributes']> {
  const [name, id] = unwrap(decodeCursor(cursor, ['string', 'string'])).map(String) as [string, string];
  return { [Op.or]: [{ name: { [Op.gt]: name } }, { name, id: { [Op.gt]: id } }] };
}
