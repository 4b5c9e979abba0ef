import { Text, View, type TextProps } from "@react-pdf/renderer";
import { linesOf } from "../printable";

interface WordsProps {
  children: string;
  style: Exclude<TextProps["style"], undefined>;
  /** Words of more signs than this are parted. */
  longest: number;
}

/** Text that somebody else wrote: of any length, with words of any length. */
export function Words({ children, style, longest }: WordsProps) {
  const lines = linesOf(children, longest);
  return lines.length === 1 ? (
    <Text style={style}>{children}</Text>
  ) : (
    <View>
      {lines.map((line, i) => (
        <Text key={i} style={style}>
          {line === "" ? " " : line}
        </Text>
      ))}
    </View>
  );
}
