using System.Globalization;
using System.Text;

namespace NetFault;

/// <summary>Writes a network as the text of a network file.</summary>
internal static class NetworkFileWriter
{
    public static string Write(Network network)
    {
        var text = new StringBuilder();
        AppendHeader(network, text);
        var fields = new FieldWriter();
        foreach (var section in AllSections.InOrder)
            AppendSection(section, section.Of(network), fields, text);
        return text.ToString();
    }

    private static void AppendHeader(Network network, StringBuilder text)
    {
        text.Append("netfault: ").Append(FileHeader.Format.ToString(CultureInfo.InvariantCulture)).Append('\n');
        if (network.Title is { } title)
            text.Append("title: ").Append(YamlScalar.Text(title)).Append('\n');
        text.Append("frequency_hz: ").Append(YamlScalar.Number(network.FrequencyHz)).Append('\n');
        text.Append("base_mva: ").Append(YamlScalar.Number(network.BaseMva)).Append('\n');
    }

    private static void AppendSection(Section section, IReadOnlyList<NetworkElement> elements, FieldWriter fields, StringBuilder text)
    {
        if (elements.Count == 0)
            return;
        text.Append('\n').Append(section.Name).Append(":\n");
        foreach (var element in elements)
        {
            section.Write(element, fields);
            fields.Flush(element.Id, text);
        }
    }
}
