import type { ReactNode } from 'react';
import { Columns, Part } from '@/components/layout/columns';
import { CaptionedPlate } from '@/components/plate/plate';
import type { GardenPage } from '@/lib/gardens/views';
import { CareList } from './care-list';
import { DrawnParticulars, Facts } from './particulars';
import { PlantingChart } from './planting-chart';
import { TimesList } from './times-list';

/** Headings of the narrow column, small enough that "Times on 15 May" stays on one line wherever the column stands. */
const ASIDE = 'mb-3 text-[1.3333rem] max-md:text-[2rem] lg:text-[1.7778rem] large-print:text-[2rem]';

/** A garden's page below its bill: what it is on the left, when and where on the right. */
export function GardenPageBody({ page, map }: { page: GardenPage; map: ReactNode }) {
  const { planting, times } = page;
  return (
    <>
      {times === null || times.isCalledOff ? null : (
        <p className="pt-4 md:hidden print:hidden">
          <a href="#times">{times.title}</a>
        </p>
      )}
      <Columns split="main-aside">
        <div>
          <CaptionedPlate plate={page.plate} />
          {page.about === null ? null : <p className="mt-5 text-lg">{page.about}</p>}
          {page.hosts === null ? null : (
            <p className="mt-3">
              <em className="text-ink-soft">at home to you:</em> {page.hosts}
            </p>
          )}
          <Part title="Particulars">
            <DrawnParticulars {...page.drawing} />
            <Facts facts={page.railway} />
          </Part>
          <Part title="The way round">
            <Facts facts={page.access} />
            <p className="mt-1">These are the host’s own figures. If one of them decides whether you can come, ask the club before you book.</p>
          </Part>
          {planting.plants.length === 0 ? null : (
            <Part title={planting.title}>
              <PlantingChart plants={planting.plants} on={planting.on} dayText={planting.dayText} />
            </Part>
          )}
        </div>
        <div>
          {times === null ? null : (
            <section id="times" className="mb-9 scroll-mt-4">
              <h2 className={ASIDE}>{times.title}</h2>
              <TimesList day={times} />
            </section>
          )}
          <section className={times === null ? '' : 'border-t border-rule pt-5'}>
            <h2 className={ASIDE}>Take care</h2>
            <CareList cautions={page.cautions} />
          </section>
          <section className="mt-9 border-t border-rule pt-5">
            <h2 className={ASIDE}>Whereabouts</h2>
            {map}
            <p className="note mt-3 leading-snug">{page.whereabouts.caption}</p>
          </section>
        </div>
      </Columns>
    </>
  );
}
