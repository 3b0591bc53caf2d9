import { listOfferRounds, offerTime } from "@withy/services/diary";
import { route } from "@/server/run-route";

export const GET = route(listOfferRounds);
export const POST = route(offerTime, { status: 201 });
