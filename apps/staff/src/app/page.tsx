import { can } from "@withy/core/access/can";
import { redirect } from "next/navigation";
import { requireSession } from "@/server/context";

/** Each person starts where their day starts. */
export default async function Home() {
  const { context, isTherapist } = await requireSession();
  if (can(context.roles, "diary.read"))
    redirect(isTherapist && !can(context.roles, "practice.manage") ? "/notes" : "/today");
  redirect(can(context.roles, "billing.read") ? "/billing" : "/account");
}
