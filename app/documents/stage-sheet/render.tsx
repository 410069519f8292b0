import { Document, Page, Path, renderToBuffer, StyleSheet, Svg, Text, View } from "@react-pdf/renderer";
import { families, registerFonts } from "#app/documents/fonts.ts";
import { paperSizes } from "#app/documents/paper.ts";
import { badgePath } from "#app/domain/repertoire/badge-path.ts";
import { layoutStageSheet, type SheetOptions } from "./layout.ts";
import type { Mark } from "./marks.ts";
import type { StageSheet } from "./sheet.ts";

const ink = "#000000";
const white = "#ffffff";

const styles = StyleSheet.create({
  page: { backgroundColor: white, color: ink, fontFamily: families as unknown as string },
  at: { position: "absolute" },
});

/** Barlow Condensed's ascender: the first baseline stands this many ems below a text's top. */
const ascent = 1;

function Drawn({ mark }: { mark: Mark }) {
  switch (mark.kind) {
    case "text":
      return (
        <Text
          style={[
            styles.at,
            {
              left: mark.x,
              top: mark.y - ascent * mark.size,
              width: mark.width + 0.5,
              fontSize: mark.size,
              fontWeight: mark.weight,
              textAlign: mark.align,
              color: mark.inverted ? white : ink,
              lineHeight: 1.2,
            },
          ]}
          wrap={false}
        >
          {mark.text}
        </Text>
      );
    case "rule":
      return (
        <View
          style={[
            styles.at,
            {
              left: mark.x,
              top: mark.y - mark.thickness / 2,
              width: mark.width,
              height: mark.thickness,
              backgroundColor: ink,
            },
          ]}
        />
      );
    case "cell":
      return (
        <View
          style={[
            styles.at,
            { left: mark.x, top: mark.y, width: mark.width, height: mark.height, backgroundColor: ink },
          ]}
        />
      );
    case "badge":
      return (
        <Svg
          style={[styles.at, { left: mark.x, top: mark.y, width: mark.width, height: mark.height }]}
          viewBox={`0 0 ${mark.width} ${mark.height}`}
        >
          <Path d={badgePath(mark.shape, mark.width, mark.height)} fill={ink} />
          {mark.shape === "double" ? (
            <Path
              d={badgePath("double", mark.width, mark.height, mark.height * 0.08)}
              fill="none"
              stroke={white}
              strokeWidth={mark.height * 0.04}
            />
          ) : null}
        </Svg>
      );
    case "triangle": {
      const { size } = mark;
      const path =
        mark.direction === "up"
          ? `M0 ${size}L${size / 2} 0L${size} ${size}Z`
          : `M0 0L${size / 2} ${size}L${size} 0Z`;
      return (
        <Svg
          style={[styles.at, { left: mark.x, top: mark.y - size / 2, width: size, height: size }]}
          viewBox={`0 0 ${size} ${size}`}
        >
          <Path d={path} fill={mark.inverted ? white : ink} />
        </Svg>
      );
    }
  }
}

/**
 * The stage sheet as PDF bytes. Same sheet, options and `at` give the same pages; `at` (when it is printed) also goes
 * into the file's metadata.
 */
export async function renderStageSheet(
  sheet: StageSheet,
  options: SheetOptions,
  author: string,
  at: Date,
): Promise<Buffer> {
  registerFonts();
  const pages = layoutStageSheet(sheet, options);
  const { width, height } = paperSizes[options.paper];
  return renderToBuffer(
    <Document
      title={`Stage sheet, ${sheet.title}`}
      author={author}
      language="en"
      creator="Stillpeg"
      producer="Stillpeg"
      creationDate={at}
      modificationDate={at}
    >
      {pages.map((page, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: pages are known by their place
        <Page key={index} size={[width, height]} style={styles.page}>
          {page.marks.map((mark, place) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: a page's marks never change places
            <Drawn key={place} mark={mark} />
          ))}
        </Page>
      ))}
    </Document>,
  );
}
