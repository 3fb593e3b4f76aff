using System.Text.Json;

namespace NetFault.Tests.Yaml;

/// <summary>The JSON Schema that editors use knows exactly the keys that the reader knows.</summary>
public class SchemaTests
{
    private static readonly JsonElement Properties = Schema().GetProperty("properties");

    [Fact]
    public void The_schema_has_the_head_and_the_sections_of_the_reader() =>
        Properties.EnumerateObject().Select(one => one.Name)
            .Should().BeEquivalentTo(FileHeader.Keys.Names.Concat(AllSections.InOrder.Select(one => one.Name)));

    [Fact]
    public void The_schema_requires_what_the_reader_requires() =>
        Required(Schema()).Should().BeEquivalentTo(FileHeader.Keys.Keys.Where(one => one.Required).Select(one => one.Name).Append("buses"));

    [Fact]
    public void Each_section_has_the_keys_of_the_reader()
    {
        foreach (var section in AllSections.InOrder)
            Compare(Properties.GetProperty(section.Name).GetProperty("additionalProperties"), section.Keys, section.Name);
    }

    private static void Compare(JsonElement schema, KeySet keys, string path)
    {
        var properties = schema.GetProperty("properties");
        properties.EnumerateObject().Select(one => one.Name).Should().BeEquivalentTo(keys.Names, path);
        Required(schema).Should().BeEquivalentTo(keys.Keys.Where(one => one.Required).Select(one => one.Name), path);
        schema.GetProperty("additionalProperties").GetBoolean().Should().BeFalse(path);
        foreach (var key in keys.Keys)
        {
            var property = properties.GetProperty(key.Name);
            Kind(property).Should().Be(key.Kind, path + "." + key.Name);
            if (key.Nested is not null)
                Compare(key.Kind == KeyKind.Group ? property : property.GetProperty("oneOf")[1], key.Nested, path + "." + key.Name);
        }
    }

    private static KeyKind Kind(JsonElement property)
    {
        if (property.TryGetProperty("$ref", out _))
            return KeyKind.Id;
        if (property.TryGetProperty("oneOf", out _))
            return KeyKind.NumberOrGroup;
        if (property.TryGetProperty("enum", out var words))
            return words[0].ValueKind == JsonValueKind.String ? KeyKind.Choice : KeyKind.Number;
        var type = property.GetProperty("type");
        return type.ValueKind == JsonValueKind.Array ? KeyKind.Text : type.GetString() switch
        {
            "number" => KeyKind.Number,
            "integer" => KeyKind.Whole,
            "boolean" => KeyKind.Flag,
            _ => KeyKind.Group,
        };
    }

    private static IEnumerable<string?> Required(JsonElement schema) =>
        schema.TryGetProperty("required", out var required) ? required.EnumerateArray().Select(one => one.GetString()) : [];

    private static JsonElement Schema() =>
        JsonDocument.Parse(File.ReadAllText(TestFiles.Repository("docs/network-file.schema.json"))).RootElement;
}
