import { Button } from '@/components/ui/button';
import { controlLook } from '@/components/ui/control-look';

type FindFormProps = {
  /** The page's own address; the words go into its query. */
  path: string;
  label: string;
  find: string;
  submit: string;
  /** What else stands in the query and stays. */
  keep?: Record<string, string>;
};

/** Looks a staff table over: a plain GET form, so that what is shown can be sent on and gone back to. */
export function FindForm({ path, label, find, submit, keep = {} }: FindFormProps) {
  return (
    <form action={path} method="get" role="search" className="my-4 flex flex-wrap items-end gap-4 print:hidden">
      <label className="grid max-w-full grid-cols-1 gap-1 font-semibold">
        {label}
        <input type="search" name="find" defaultValue={find} maxLength={200} className={controlLook('half', 'text')} />
      </label>
      {Object.entries(keep).map(([name, value]) => <input key={name} type="hidden" name={name} value={value} />)}
      <Button type="submit" tone="plain">{submit}</Button>
    </form>
  );
}
