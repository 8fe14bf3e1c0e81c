'use client';
import { useRef, useState } from 'react';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { stepNumber } from '@/lib/domain/plan/find';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { BenchLink } from '../shell/bench-link';
import { useBuild } from '../shell/build-context';
import { LargeDrawing } from './large-drawing';
import { usePackFile } from './use-pack-file';

type PlanFile = PlanDocument['attachments'][number];

/** A drawing or another file of the plan, from the pack on this phone. */
export function PackFileFigure({ file }: { file: PlanFile }) {
  const { build, plan } = useBuild();
  const found = usePackFile(file.sha256);
  const [large, setLarge] = useState(false);
  const opener = useRef<HTMLButtonElement>(null);
  const isPicture = file.mediaType.startsWith('image/');
  return (
    <figure className="grid gap-2">
      {found.state === 'looking' && <p className="text-[1.0625rem] text-soft">Fetching it from this phone.</p>}
      {found.state === 'absent' && (
        <Notice tone="info" title="Not on this phone.">
          {file.title} was cleared away, or the build was taken to the bench before it was part of the plan.{' '}
          <BenchLink to={{ buildId: build.id, view: 'take' }} className="text-blue underline">
            Take it to the bench again
          </BenchLink>{' '}
          where there is a signal.
        </Notice>
      )}
      {found.state === 'here' && isPicture && (
        <button
          ref={opener}
          type="button"
          onClick={() => setLarge(true)}
          className="border-2 border-iron bg-white p-1"
          aria-label={`${file.title}: show it large`}
        >
          {/* From this phone's own storage: there is nothing for an image service to make smaller. */}
          {/* eslint-disable-next-line @next/next/no-img-element */}
          <img src={found.address} alt="" className="w-full object-contain" />
        </button>
      )}
      <figcaption className="grid gap-1 text-[1.0625rem]">
        <b className="text-[1.25rem]">{file.title}</b>
        {file.steps.length > 0 && (
          <span className="text-soft">
            For {file.steps.length === 1 ? 'step' : 'steps'}{' '}
            {file.steps.map((id, index) => (
              <span key={id}>
                {index > 0 && ', '}
                <BenchLink to={{ buildId: build.id, view: 'step', stepId: id }} className="text-blue underline">
                  {stepNumber(plan, id)}
                </BenchLink>
              </span>
            ))}
          </span>
        )}
      </figcaption>
      {found.state === 'here' &&
        (isPicture ? (
          <Button kind="quiet" className="justify-self-start" onClick={() => setLarge(true)}>
            Show it large
          </Button>
        ) : (
          <a
            href={found.address}
            download={fileName(file)}
            className="flex min-h-[64px] items-center text-[1.25rem] text-blue underline"
          >
            Save {file.title} on this phone
          </a>
        ))}
      {large && found.state === 'here' && (
        <LargeDrawing
          title={file.title}
          address={found.address}
          onClose={() => {
            setLarge(false);
            opener.current?.focus();
          }}
        />
      )}
    </figure>
  );
}

const ENDINGS: Partial<Record<PlanFile['mediaType'], string>> = {
  'application/pdf': 'pdf',
  'model/gltf-binary': 'glb',
};

function fileName({ id, mediaType }: PlanFile): string {
  return `${id}.${ENDINGS[mediaType] ?? 'bin'}`;
}
