import { useLocation } from "react-router";
import { errorWords } from "#app/components/error-words.ts";
import { PlainPage } from "#app/components/plain-page.tsx";
import { ButtonLink, buttonClass } from "#app/components/ui/button.tsx";

/** What a person sees where a page cannot be shown: what happened and where to go. Never a stack trace. */
export function ErrorPage({ error }: { error: unknown }) {
  const { pathname, search } = useLocation();
  const { title, message, tryAgain } = errorWords(error);
  return (
    <PlainPage title={title}>
      <p>{message}</p>
      <div className="flex flex-wrap gap-2">
        {tryAgain ? (
          <a href={pathname + search} className={buttonClass("primary")}>
            Try again
          </a>
        ) : null}
        <ButtonLink to="/" look={tryAgain ? "plain" : "primary"}>
          Go to the start
        </ButtonLink>
      </div>
    </PlainPage>
  );
}
