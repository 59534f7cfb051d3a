import { Empty } from "@/components/ui/empty";
import { PageHead } from "@/components/ui/page-head";

/** What lies in the frame of a project at an address where it has nothing. */
export default function NoSuchSheet() {
  return (
    <div className="p-6">
      <PageHead title="There is nothing at this address" />
      <Empty title="The address may have been mistyped, or what stood here belongs to another project.">
        The index of sheets leads on.
      </Empty>
    </div>
  );
}
