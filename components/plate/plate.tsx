import Image from 'next/image';
import type { PlateView } from '@/lib/gardens/views';

type PlateProps = {
  plate: PlateView;
  /** `first` is fetched at once, because it is what a reader sees first; the others when they come near. */
  when?: 'first' | 'near';
  /** Beside a name that says the same, a plate need not be read out. */
  isRepeated?: boolean;
};

/** A garden's linocut. It is a print of its own and keeps its daylight inks in the evening. */
export function Plate({ plate, when = 'near', isRepeated = false }: PlateProps) {
  return (
    <Image
      unoptimized // drawn by us, to the line: there is nothing to shrink
      src={plate.href}
      alt={isRepeated ? '' : plate.alt}
      width={1200}
      height={680}
      className="block h-auto w-full"
      {...(when === 'first' ? { loading: 'eager', fetchPriority: 'high' } : {})}
    />
  );
}

/** A plate with the line that says what it was cut from. */
export function CaptionedPlate({ plate }: { plate: PlateView }) {
  return (
    <figure>
      <Plate plate={plate} when="first" />
      <figcaption className="note mt-2.5 max-w-[62ch] text-[1.0556rem] leading-snug">{plate.caption}</figcaption>
    </figure>
  );
}
