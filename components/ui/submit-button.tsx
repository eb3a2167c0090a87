"use client";

import { useFormStatus } from "react-dom";
import { Button, type ButtonProps } from "./button";

/** The button that sends its form, and says so while the answer is awaited. */
export function SubmitButton({ pending = false, ...props }: ButtonProps) {
  const status = useFormStatus();
  return <Button type="submit" variant="fill" {...props} pending={pending || status.pending} />;
}
