import { inviteStaffMember, listStaff } from "@withy/services/practices";
import { route } from "@/server/run-route";

export const GET = route(listStaff);
export const POST = route(inviteStaffMember, { status: 201 });
