import { newId } from "@withy/core/ids";
import type { NextRequest } from "next/server";
import NextAuth from "next-auth";
import { authOptions } from "@/server/auth";
import { checkOrigin, problemResponse } from "@/server/run-route";

type Params = { params: Promise<{ nextauth: string[] }> };

export function GET(request: NextRequest, context: Params) {
  return NextAuth(request as never, context as never, authOptions());
}

export function POST(request: NextRequest, context: Params) {
  try {
    checkOrigin(request);
  } catch (error) {
    return problemResponse(error, newId(), "POST", "/api/auth");
  }
  return NextAuth(request as never, context as never, authOptions());
}
