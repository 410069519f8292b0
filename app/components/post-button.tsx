import type { ComponentProps, ReactNode } from "react";
import { Form } from "react-router";
import { Button } from "#app/components/ui/button.tsx";

type PostButtonProps = Omit<ComponentProps<typeof Button>, "type"> & {
  action: string;
  children: ReactNode;
};

/** A button that posts to an address of its own, also where scripts do not run. */
export function PostButton({ action, children, ...rest }: PostButtonProps) {
  return (
    <Form method="post" action={action} className="inline-flex">
      <Button type="submit" {...rest}>
        {children}
      </Button>
    </Form>
  );
}
