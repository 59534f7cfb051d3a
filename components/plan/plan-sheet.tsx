"use client";

import dynamic from "next/dynamic";
import Link from "next/link";
import { useState } from "react";
import { Sign } from "@/components/figures/sign";
import { Button } from "@/components/ui/button";
import { Empty } from "@/components/ui/empty";
import { ErrorNote } from "@/components/ui/error-note";
import { PageHead } from "@/components/ui/page-head";
import { Skeleton } from "@/components/ui/skeleton";
import { TextInput } from "@/components/ui/text-input";
import { Problem } from "@/lib/client/fetch-json";
import { useUnits } from "@/lib/client/use-holes";
import { usePlan, useZones } from "@/lib/client/use-plan";
import type { UnitRow } from "@/lib/contracts/ground";
import { holeKinds } from "@/lib/contracts/ground-words";
import type { PlanFooting, PlanHole, PlanPage } from "@/lib/contracts/plan";
import type { ZoneRow } from "@/lib/contracts/zones";
import { figure, utilisation } from "@/lib/units/format-quantity";
import type { Picked } from "./marks";
import type { Task } from "./plan-map";
import { ZonePanel } from "./zone-panel";

// Leaflet asks for a window when it is loaded: it comes in the browser alone, and after the rest of the sheet.
const PlanMap = dynamic(() => import("./plan-map"), {
  ssr: false,
  loading: () => <Skeleton lines={12} label="The plan is being drawn" />,
});

type Props = { projectId: string; mayDraw: boolean; units: { units: UnitRow[] } };

const nothing: PlanPage = { holes: [], footings: [], sitePlan: null };

/** The plan of the site: zones, holes and footings to scale, and beside it what is picked and everything in lists. */
export function PlanSheet({ projectId, mayDraw, units }: Props) {
  const plan = usePlan(projectId);
  const zones = useZones(projectId);
  const unitList = useUnits(projectId, units).data ?? units;
  const [layers, setLayers] = useState({ zones: true, holes: true, footings: true, names: true });
  const [picked, setPicked] = useState<Picked>(null);
  const [chosenZone, setChosenZone] = useState<string | null>(null);
  const [task, setTask] = useState<Task>({ kind: "look" });
  const [ring_m, setRing] = useState<[number, number][] | null>(null);
  const [search, setSearch] = useState("");
  const drawn = plan.data ?? nothing;
  const zoneRows = zones.data?.zones ?? [];
  const problem = plan.error ?? zones.error;
  const settled = plan.data && zones.data;
  const bare = settled && drawn.holes.length + drawn.footings.length + zoneRows.length === 0;
  const zone = zoneRows.find(({ id }) => id === chosenZone) ?? null;
  const rest = () => {
    setTask({ kind: "look" });
    setRing(null);
  };
  return (
    <div aria-busy={!settled && !problem}>
      <PageHead
        title="Plan"
        actions={
          mayDraw && task.kind === "look" ? (
            <Button kind="main" onClick={() => setTask({ kind: "draw" })}>
              Draw a zone
            </Button>
          ) : undefined
        }
      >
        Ground between holes is interpreted. Metres of the site grid, north upwards.
      </PageHead>
      {problem instanceof Problem && <ErrorNote problem={problem} onRetry={() => void plan.refetch()} />}
      {bare && task.kind === "look" && (
        <Empty title="Nothing is on the plan yet." className="mb-4">
          Import or record holes on sheet 2, draw zones here, enter footings on sheet 5.
        </Empty>
      )}
      <div className="grid gap-5 xl:grid-cols-[1fr_20rem]">
        <div>
          <fieldset className="mb-2 flex flex-wrap gap-x-5 gap-y-1" data-screen-only>
            <legend className="sr-only">Layers</legend>
            {(["zones", "holes", "footings", "names"] as const).map((name) => (
              <label key={name} className="flex items-center gap-2">
                <input
                  type="checkbox"
                  checked={layers[name]}
                  onChange={(event) => setLayers({ ...layers, [name]: event.target.checked })}
                />
                {name}
              </label>
            ))}
          </fieldset>
          <PlanMap
            plan={drawn}
            zones={zoneRows}
            layers={layers}
            picked={picked}
            chosenZone={chosenZone}
            task={task}
            onPick={(found) => {
              setPicked(found);
              if (found) setChosenZone(null);
            }}
            onZone={(id) => setChosenZone(id)}
            onRing={setRing}
          />
          <Legend />
        </div>
        <div>
          {task.kind === "draw" && (
            <ZonePanel
              projectId={projectId}
              units={unitList.units}
              zone={null}
              ring_m={ring_m}
              onDone={rest}
            />
          )}
          {task.kind === "reshape" && zone && (
            <ZonePanel
              key={zone.id}
              projectId={projectId}
              units={unitList.units}
              zone={zone}
              ring_m={ring_m}
              onDone={rest}
            />
          )}
          {task.kind === "look" && (
            <>
              <PickedPanel projectId={projectId} plan={drawn} picked={picked} />
              {zone && (
                <ZoneFacts
                  projectId={projectId}
                  zone={zone}
                  units={unitList.units}
                  onReshape={mayDraw ? () => setTask({ kind: "reshape", zoneId: zone.id }) : undefined}
                />
              )}
              <Lists
                plan={drawn}
                zones={zoneRows}
                search={search}
                onSearch={setSearch}
                onPick={(found) => {
                  setPicked(found);
                  setChosenZone(null);
                }}
                onZone={setChosenZone}
              />
            </>
          )}
        </div>
      </div>
    </div>
  );
}

function Legend() {
  return (
    <div className="mt-2 flex flex-wrap items-center gap-x-5 gap-y-1 text-sm">
      <Sign name="passes" size="small" />
      <Sign name="fails" size="small" />
      <Sign name="affected" size="small" />
      <Sign name="outside conditions" size="small" />
      <Sign name="no check yet" size="small" />
      <span>⊕ borehole</span>
      <span>□ pit</span>
      <span>▽ probe or sampler</span>
      <span>boundary: — proved, - - interpolated, · · inferred</span>
    </div>
  );
}

function PickedPanel({ projectId, plan, picked }: { projectId: string; plan: PlanPage; picked: Picked }) {
  if (picked?.kind === "footing") {
    const footing = plan.footings.find(({ id }) => id === picked.id);
    return footing ? <FootingFacts projectId={projectId} footing={footing} /> : null;
  }
  if (picked?.kind === "hole") {
    const hole = plan.holes.find(({ id }) => id === picked.id);
    return hole ? <HoleFacts projectId={projectId} hole={hole} /> : null;
  }
  return <p className="mb-4 text-ink-2">Press a footing, a hole or a zone to see what it rests on.</p>;
}

function FootingFacts({ projectId, footing }: { projectId: string; footing: PlanFooting }) {
  return (
    <section className="mb-4 border border-rule p-4" aria-live="polite">
      <h2 className="text-lg">Footing {footing.mark}</h2>
      <p>
        {footing.breadth_m.toFixed(2)} × {footing.length_m.toFixed(2)} m, {footing.stage}
      </p>
      <p className="mt-1 flex flex-wrap gap-4">
        <Sign name={footing.verdict ?? "no check yet"} />
        {footing.standing === "affected" && <Sign name="affected" />}
      </p>
      {footing.utilisation !== null && <p>Utilisation {utilisation(footing.utilisation)}</p>}
      {!footing.linked && <p>Linked to no value.</p>}
      <Link className="underline" href={`/projects/${projectId}/footings/${footing.id}`}>
        Open footing {footing.mark}
      </Link>
    </section>
  );
}

function HoleFacts({ projectId, hole }: { projectId: string; hole: PlanHole }) {
  return (
    <section className="mb-4 border border-rule p-4" aria-live="polite">
      <h2 className="text-lg">Hole {hole.name}</h2>
      <p>
        {holeKinds[hole.kind] ?? hole.kind}
        {hole.status && `, ${hole.status.toLowerCase()}`}
      </p>
      <p>
        {hole.groundLevel_m === null
          ? "Ground level not stated"
          : `Ground level ${figure(hole.groundLevel_m, "level")} m`}
      </p>
      <Link className="underline" href={`/projects/${projectId}/holes/${hole.id}`}>
        Open hole {hole.name}
      </Link>
    </section>
  );
}

function ZoneFacts(props: { projectId: string; zone: ZoneRow; units: UnitRow[]; onReshape?: () => void }) {
  const { projectId, zone, units, onReshape } = props;
  const names = zone.groundUnitIds
    .map((id) => units.find((unit) => unit.id === id))
    .filter((unit) => unit !== undefined);
  return (
    <section className="mb-4 border border-rule p-4" aria-live="polite">
      <h2 className="text-lg">{zone.name}</h2>
      <p>
        Boundary {zone.number}, {zone.boundary}
      </p>
      <p>For {names.map((unit) => `${unit.code} ${unit.name}`).join(", ")}</p>
      {zone.values.map((value) => (
        <p key={value.id}>
          <Link className="underline" href={`/projects/${projectId}/values/${value.id}`}>
            {value.reference}
          </Link>{" "}
          {value.code === null
            ? "no revision in force"
            : `${value.code}, ${value.netAllowable_kPa === null ? "not a single figure" : `${figure(value.netAllowable_kPa, "pressure")} kPa net`}`}
        </p>
      ))}
      {zone.values.length === 0 && <p>No bearing value yet.</p>}
      {onReshape && (
        <Button className="mt-3" onClick={onReshape}>
          Change {zone.name}
        </Button>
      )}
    </section>
  );
}

/** Everything on the plan by name, for those who do not point. */
function Lists(props: {
  plan: PlanPage;
  zones: ZoneRow[];
  search: string;
  onSearch: (typed: string) => void;
  onPick: (picked: Picked) => void;
  onZone: (zoneId: string) => void;
}) {
  const { plan, zones, search, onSearch, onPick, onZone } = props;
  const wanted = search.trim().toLowerCase();
  const found = wanted
    ? [
        ...plan.footings
          .filter(({ mark }) => mark.toLowerCase().startsWith(wanted))
          .map(({ id, mark }) => ({ kind: "footing" as const, id: id as string, name: mark })),
        ...plan.holes
          .filter(({ name }) => name.toLowerCase().startsWith(wanted))
          .map(({ id, name }) => ({ kind: "hole" as const, id: id as string, name })),
      ].slice(0, 20)
    : [];
  return (
    <section>
      <TextInput
        label="Find a footing or hole on the plan"
        type="search"
        optional
        value={search}
        onChange={(event) => onSearch(event.target.value)}
      />
      <ul className="mt-1">
        {found.map(({ kind, id, name }) => (
          <li key={id}>
            <Button kind="text" onClick={() => onPick({ kind, id })}>
              {kind} {name}
            </Button>
          </li>
        ))}
      </ul>
      <h2 className="mt-4 text-lg">Zones</h2>
      <ul>
        {zones.map((zone) => (
          <li key={zone.id}>
            <Button kind="text" onClick={() => onZone(zone.id)}>
              {zone.name}
            </Button>
          </li>
        ))}
        {zones.length === 0 && <li className="text-ink-2">No zone yet.</li>}
      </ul>
    </section>
  );
}
