'use client';

import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { FileDrop } from '@/components/ui/file-drop';
import { Select, TextInput } from '@/components/ui/inputs';
import { Progress } from '@/components/ui/progress';
import { ApiProblem } from '@/lib/platform/http/call-api';
import { PHOTO_KINDS } from '@/lib/reports/schema';
import type { EditorValues, PhotoValues } from './editor-values';
import { sendFile } from './send-file';
import { shrinkPhoto } from './shrink-photo';
import type { StepProps } from './step-props';

const accepted = z.object({ publicId: z.string(), removedMetadata: z.array(z.string()) });

export function StepPhotos({ errorOf }: StepProps) {
  const form = useFormContext<EditorValues>();
  const photos = useWatch({ control: form.control, name: 'photos' });
  const [sending, setSending] = useState<{ name: string; share: number; done: number; of: number } | null>(null);
  const [problems, setProblems] = useState<string[]>([]);

  const send = async (files: File[]) => {
    setProblems([]);
    for (const [i, file] of files.entries()) {
      const tell = (share: number) => setSending({ name: file.name, share, done: i, of: files.length });
      tell(0);
      try {
        const shrunk = await shrinkPhoto(file);
        const photo = await sendFile({
          path: '/api/v1/photos',
          file: shrunk.file,
          name: shrunk.name,
          answer: accepted,
          onProgress: tell,
          signal: new AbortController().signal,
        });
        const removed = [...new Set([...shrunk.removed, ...photo.removedMetadata])];
        const known = form.getValues('photos');
        const kind = known.length === 0 ? 'display' : 'set-up';
        form.setValue('photos', [...known, { publicId: photo.publicId, kind, caption: '', removed }]);
      } catch (error) {
        const message = error instanceof ApiProblem ? `${file.name}: ${error.message}` : (error as Error).message;
        setProblems((before) => [...before, message]);
      }
    }
    setSending(null);
  };
  const move = (index: number, by: number) => {
    const order = [...photos];
    const [photo] = order.splice(index, 1);
    if (photo) order.splice(index + by, 0, photo);
    form.setValue('photos', order);
  };

  return (
    <>
      <p className="max-w-prose">
        The instrument’s display with its reading, the set-up, the rating plate. Leave people and papers out of the
        picture. Place and camera data are taken out before a photo is kept.
      </p>
      <FileDrop
        name="photos"
        label="Photos"
        hint="JPEG, PNG, or whatever this browser can read; they are made smaller before they travel."
        accept="image/*"
        multiple
        optional
        error={problems.join(' ') || errorOf('photos')}
        onFiles={(files) => void send(files)}
      >
        {sending && (
          <Progress
            label={`Sending ${sending.name}`}
            value={sending.share < 1 ? sending.share : undefined}
            status={`${sending.done + 1} of ${sending.of}`}
          />
        )}
      </FileDrop>
      <ol>
        {photos.map((photo, index) => (
          <li key={photo.publicId} className="flex flex-wrap gap-6 border-b border-rule py-4">
            <PhotoCard photo={photo} index={index} />
            <p className="flex w-full flex-wrap gap-x-5">
              {index > 0 && (
                <Button look="quiet" onClick={() => move(index, -1)}>
                  Move photo {index + 1} up
                </Button>
              )}
              {index < photos.length - 1 && (
                <Button look="quiet" onClick={() => move(index, 1)}>
                  Move photo {index + 1} down
                </Button>
              )}
              <Button
                look="quiet"
                onClick={() =>
                  form.setValue(
                    'photos',
                    photos.filter((known) => known !== photo),
                  )
                }
              >
                Remove photo {index + 1}
              </Button>
            </p>
          </li>
        ))}
      </ol>
    </>
  );
}

function PhotoCard({ photo, index }: { photo: PhotoValues; index: number }) {
  const form = useFormContext<EditorValues>();
  return (
    <>
      {/* eslint-disable-next-line @next/next/no-img-element -- the image optimiser is off: photos come in two sizes of our own */}
      <img
        src={`/api/v1/photos/${photo.publicId}/small`}
        alt={`Photo ${index + 1}: ${PHOTO_KINDS[photo.kind]}`}
        className="h-40 w-56 rounded border border-rule object-contain"
      />
      <div className="min-w-64 flex-1">
        <Select
          label={`What photo ${index + 1} shows`}
          fieldClassName="mt-0"
          options={Object.entries(PHOTO_KINDS).map(([value, label]) => ({ value, label }))}
          {...form.register(`photos.${index}.kind`)}
        />
        <TextInput label={`Caption of photo ${index + 1}`} optional {...form.register(`photos.${index}.caption`)} />
        <p role="status" className="text-caption text-muted">
          {photo.removed.length > 0
            ? `Taken out: ${photo.removed.join(', ')}.`
            : 'It carried no place and no camera data.'}
        </p>
      </div>
    </>
  );
}
