import type { PatientView, TimelineKind } from "@withy/contracts/patients";
import { can } from "@withy/core/access/can";
import type { Permission } from "@withy/core/access/permissions";
import { plainDateWords, shortDate } from "@withy/core/date-words";
import { dayOf } from "@withy/core/zoned-time";
import { listCourses } from "@withy/services/diary";
import { getTimeline } from "@withy/services/patients";
import { PatientCourses } from "@/features/diary/components/patient-courses";
import { PatientFacts } from "@/features/patients/components/patient-facts";
import { Timeline } from "@/features/patients/components/timeline";
import { orNotFound, requireContext } from "@/server/context";
import { openPatient } from "./open-patient";

const kinds: readonly { value: TimelineKind; label: string; permission: Permission }[] = [
  { value: "all", label: "all", permission: "patients.read" },
  { value: "visits", label: "visits", permission: "diary.read" },
  { value: "notes", label: "notes", permission: "clinical.read" },
  { value: "measures", label: "measures", permission: "clinical.read" },
  { value: "letters", label: "letters", permission: "letters.read" },
  { value: "money", label: "money", permission: "billing.read" },
  { value: "messages", label: "messages", permission: "messaging.read" },
];

export default async function PatientPage({ params }: PageProps<"/patients/[patientId]">) {
  const { patientId } = await params;
  const ctx = await requireContext("patients.read");
  const patient = await openPatient(patientId);
  const [first, courses] = await Promise.all([
    orNotFound(getTimeline(ctx, { patientId })),
    can(ctx.roles, "diary.read") ? listCourses(ctx, { patientId }) : null,
  ]);
  const today = dayOf(ctx.clock.now(), ctx.zone);
  const { title, aside } = headWords(patient, today);
  return (
    <div className="pcols">
      <Timeline
        patientId={patientId}
        title={title}
        aside={aside}
        today={today}
        first={first}
        kinds={kinds.filter(({ permission }) => can(ctx.roles, permission))}
      />
      <PatientFacts patient={patient} today={today}>
        {courses && (
          <PatientCourses patientId={patientId} courses={courses} mayBook={can(ctx.roles, "diary.book")} />
        )}
      </PatientFacts>
    </div>
  );
}

function headWords({ clinical, registeredOn }: PatientView, today: string) {
  const episode = clinical?.openEpisode;
  return episode
    ? {
        title: `${episode.problem}, since ${shortDate(episode.openedOn, today)}`,
        aside: `open episode, ${episode.therapistName}`,
      }
    : { title: "Timeline", aside: `registered ${plainDateWords(registeredOn)}` };
}
