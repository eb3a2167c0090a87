import { redirect } from "next/navigation";

/** The shop's staff begin at their day. */
export default function Home() {
  redirect("/staff");
}
