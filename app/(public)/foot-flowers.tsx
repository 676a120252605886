import { GardenFoot } from '@/components/layout/garden-margin';
import { inFlowerNow } from '@/lib/gardens/flowers';
import type { Ctx } from '@/lib/infra/context';

/** What is in flower in the members' gardens today, on the foot rule of a page that belongs to no one garden. */
export async function FootFlowers({ ctx }: { ctx: Ctx }) {
  return <GardenFoot plants={await inFlowerNow(ctx)} />;
}
