import 'server-only';
import { z } from 'zod';
import { database } from '@/lib/platform/database/connection';
import { notFound } from '@/lib/platform/errors';
import { defineRoute } from '@/lib/platform/http/route';
import { openKept } from '@/lib/platform/storage/files';
import { receiveUpload } from '@/lib/platform/storage/receive-upload';
import { acceptPhoto } from '../commands/photos';
import { maySeeEvidence } from '../policy';
import { standingOf } from '../queries/traces';

const MOST_BYTES = 20_000_000;

export const uploadPhotoRoute = defineRoute({
  operationId: 'uploadPhoto',
  method: 'POST',
  path: '/api/v1/photos',
  summary: 'Sends a photo, which is written anew in two sizes, upright and without metadata.',
  access: 'member',
  limit: { name: 'photo uploads', atOnce: 20, perMinute: 15 },
  upload: { description: 'The picture in “file”: JPEG or PNG, at most 20 MB and 24 megapixels.' },
  success: {
    status: 201,
    description: 'The photo, and which kinds of metadata were taken out.',
    body: z.object({
      publicId: z.string(),
      width: z.int(),
      height: z.int(),
      removedMetadata: z.array(z.string()),
    }),
  },
  handle: async ({ actor, request }) => ({
    body: await acceptPhoto(actor.memberId, await receiveUpload(request, MOST_BYTES)),
  }),
});

export const getPhotoRoute = defineRoute({
  operationId: 'getPhoto',
  method: 'GET',
  path: '/api/v1/photos/{id}/{size}',
  summary: 'A photo in one of its two sizes.',
  access: 'anyone',
  params: z.object({ id: z.string(), size: z.enum(['large', 'small']) }),
  success: { status: 200, description: 'The picture.', body: null, contentType: 'image/jpeg' },
  handle: async ({ actor, params: { id, size }, request }) => {
    const row = await database().models.Attachment.findOne({ where: { publicId: id } });
    if (!row) throw notFound('photo');
    const standing = await standingOf('report_revision_attachment', 'attachment_id', row.id);
    if (!maySeeEvidence(actor, { memberId: row.memberId, ...standing })) throw notFound('photo');
    const etag = `"${size === 'large' ? row.largeHash : row.smallHash}"`;
    const headers = {
      etag,
      // A published photo may be hidden one day, so even its own browser asks again.
      'cache-control': standing.isPublished ? 'public, no-cache' : 'private, no-store',
      'content-security-policy': "default-src 'none'; sandbox",
      'cross-origin-resource-policy': 'same-origin',
      'x-content-type-options': 'nosniff',
    };
    if (request.headers.get('if-none-match') === etag) return new Response(null, { status: 304, headers });
    const { stream, bytes } = await openKept(size === 'large' ? row.storedLarge : row.storedSmall);
    return new Response(stream, {
      headers: {
        ...headers,
        'content-type': 'image/jpeg',
        'content-length': String(bytes),
        'content-disposition': `inline; filename="photo-${row.publicId}-${size}.jpg"`,
      },
    });
  },
});

export const photoRoutes = [uploadPhotoRoute, getPhotoRoute];
