'use client';

import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import { Select, TextInput } from '@/components/ui/inputs';
import type { EditorValues } from './editor-values';
import type { StepProps } from './step-props';
import type { EditorDevice } from './use-editor-data';

const MOST_SHOWN = 8;
const squeeze = (text: string) => text.toLowerCase().replace(/[^\p{L}\p{N}]+/gu, '');

/** Devices whose name, other names or category hold what was typed; dashes and spaces make no difference. */
function findDevices(devices: EditorDevice[], text: string): EditorDevice[] {
  const wanted = squeeze(text);
  if (wanted.length < 2) return [];
  return devices
    .filter((device) =>
      [device.name, ...device.aliases, device.category.name].some((name) => squeeze(name).includes(wanted)),
    )
    .slice(0, MOST_SHOWN);
}

/** The device by search, or a proposal of one that is not there. */
export function StepDevice({ data, errorOf }: StepProps) {
  const form = useFormContext<EditorValues>();
  const [text, setText] = useState('');
  const values = useWatch({ control: form.control }) as EditorValues;
  const chosen = data.devices.find((device) => device.publicId === values.devicePublicId);
  const choose = (device: EditorDevice) => {
    form.setValue('devicePublicId', device.publicId);
    form.setValue('deviceName', device.name);
    form.setValue('proposesDevice', false);
    form.setValue('variantId', '');
    setText('');
  };
  return (
    <>
      {chosen && !values.proposesDevice && (
        <Notice title={chosen.name}>
          {chosen.category.name}
          {chosen.aliases.length > 0 && `, also called ${chosen.aliases.join(', ')}`}
        </Notice>
      )}
      {!values.proposesDevice && (
        <>
          <TextInput
            id="device"
            name="deviceSearch"
            label={chosen ? 'Another device' : 'Which device?'}
            hint="Maker and model, as the rating plate says."
            error={errorOf('device')}
            autoComplete="off"
            value={text}
            onChange={(event) => setText(event.target.value)}
          />
          <ul aria-label="Devices found" className="max-w-prose">
            {findDevices(data.devices, text).map((device) => (
              <li key={device.publicId} className="border-b border-rule">
                <button
                  type="button"
                  onClick={() => choose(device)}
                  className="flex target w-full flex-wrap items-baseline gap-x-3 py-2 text-left hover:underline"
                >
                  <span className="font-semibold">{device.name}</span>
                  <span className="text-caption text-muted">{device.category.name}</span>
                </button>
              </li>
            ))}
          </ul>
          {squeeze(text).length >= 2 && findDevices(data.devices, text).length === 0 && (
            <p role="status" className="text-note text-muted">
              None is called that.
            </p>
          )}
          {chosen && chosen.variants.length > 1 && (
            <p className="text-note text-muted">
              Variants: {chosen.variants.map((variant) => variant.publicLabel).join('; ')}. Say in the notes which one
              it is.
            </p>
          )}
          <Button
            look="quiet"
            onClick={() => {
              form.setValue('proposesDevice', true);
              form.setValue('model', text);
            }}
          >
            It is not there: propose it
          </Button>
        </>
      )}
      {values.proposesDevice && (
        <>
          <Select
            label="Category"
            placeholder="Choose a category"
            options={data.categories.map((category) => ({ value: category.publicId, label: category.name }))}
            error={errorOf('categoryPublicId')}
            {...form.register('categoryPublicId')}
          />
          <TextInput label="Maker" error={errorOf('maker')} {...form.register('maker')} />
          <TextInput
            label="Model"
            hint="As the rating plate says."
            error={errorOf('model')}
            {...form.register('model')}
          />
          <TextInput label="Generation" optional error={errorOf('generation')} {...form.register('generation')} />
          <Button look="quiet" onClick={() => form.setValue('proposesDevice', false)}>
            Choose a device that is there
          </Button>
        </>
      )}
      <TextInput
        label="Which one of them?"
        optional
        hint="Name this very unit, for example “the pantry’s, of 2019, seal replaced”. Two reports of one unit count once."
        error={errorOf('unitLabel')}
        {...form.register('unitLabel')}
      />
    </>
  );
}
